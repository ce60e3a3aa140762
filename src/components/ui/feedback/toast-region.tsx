import { createContext, useCallback, useContext, useEffect, useMemo, useRef, useState, type ReactNode } from 'react'
import { Link } from 'react-router-dom'
import { Icon } from '../icon.tsx'

export type Toast = {
  text: ReactNode
  /** `bad` stays until it is closed. */
  kind?: 'good' | 'bad'
  /** One way on: a page or a deed ("Undo"). */
  action?: { label: string; to: string } | { label: string; onPress: () => void }
}
type Shown = Toast & { id: number }

const Say = createContext<((toast: Toast) => void) | null>(null)
const shownMs = 8000
const atOnce = 3

/** Says that something has happened: `const say = useToast(); say({ text: 'Report issued and mailed.', action: { label: 'Open', to } })`. */
export function useToast(): (toast: Toast) => void {
  const say = useContext(Say)
  if (!say) throw new Error('useToast is used outside of ToastRegion')
  return say
}

/** The one place where toasts appear, round the whole app. At most three at once, the rest wait; reading one (pointer or focus) stops its clock. */
export function ToastRegion({ children }: { children: ReactNode }) {
  const [queue, setQueue] = useState<readonly Shown[]>([])
  const next = useRef(0)
  const say = useCallback((toast: Toast) => setQueue((all) => [...all, { ...toast, id: next.current++ }]), [])
  const close = useCallback((id: number) => setQueue((all) => all.filter((toast) => toast.id !== id)), [])
  const shown = useMemo(() => queue.slice(0, atOnce), [queue])
  return (
    <Say.Provider value={say}>
      {children}
      <div role="region" aria-label="News" aria-live="polite" className="not-printed pointer-events-none fixed right-gutter bottom-6 left-gutter z-60 mx-auto grid max-w-[560px] gap-2.5">
        {shown.map((toast) => <ToastLine key={toast.id} toast={toast} onClose={close} />)}
      </div>
    </Say.Provider>
  )
}

function ToastLine({ toast, onClose }: { toast: Shown; onClose: (id: number) => void }) {
  const [read, setRead] = useState(false)
  const { id, kind, action } = toast
  useEffect(() => {
    if (read || kind === 'bad') return
    const timer = setTimeout(() => onClose(id), shownMs)
    return () => clearTimeout(timer)
  }, [id, kind, onClose, read])
  const link = 'ml-auto font-medium whitespace-nowrap underline decoration-current! underline-offset-3 outline-current!'
  return (
    <div onPointerEnter={() => setRead(true)} onPointerLeave={() => setRead(false)} onFocus={() => setRead(true)} onBlur={() => setRead(false)} className="rise pointer-events-auto flex items-center gap-4 rounded bg-ink px-4 py-3 text-paper shadow-float">
      <Icon name={kind === 'bad' ? 'stop' : 'check'} />
      <span>{toast.text}</span>
      {action && ('to' in action ? <Link to={action.to} onClick={() => onClose(id)} className={link}>{action.label}</Link>
        : <button type="button" onClick={() => { action.onPress(); onClose(id) }} className={link}>{action.label}</button>)}
      <button type="button" aria-label="Close" onClick={() => onClose(id)} className={`${action ? '' : 'ml-auto'} -m-1.5 p-1.5 outline-current!`}><Icon name="cross" /></button>
    </div>
  )
}
