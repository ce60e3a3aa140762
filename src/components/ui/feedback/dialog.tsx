import * as Radix from '@radix-ui/react-dialog'
import { useRef, type FormEvent, type ReactNode } from 'react'
import { Button } from '../buttons/button.tsx'

/**
 * Asks before something is done; for confirming only, never for pages of input. Focus stays inside, `Esc` closes, focus goes back.
 * `<Dialog open={open} onOpenChange={setOpen} title="Strike out reading 4?" confirm="Strike out" onConfirm={…}>It stays on the record…</Dialog>`
 * Fields (a reason) may stand in `children`; Enter in them confirms. The caller closes it when the work is done.
 */
export function Dialog({ open, onOpenChange, title, children, confirm, cancel = 'Keep it', danger = false, busy = false, refusal, error, onConfirm }: {
  open: boolean
  onOpenChange: (open: boolean) => void
  title: string
  children?: ReactNode
  /** The deed, as on the button that opened it. */
  confirm: string
  cancel?: string
  danger?: boolean
  busy?: boolean
  refusal?: string | undefined
  error?: string | undefined
  onConfirm: () => void
}) {
  const opener = useRef<Element>(null)
  const submit = (event: FormEvent) => {
    event.preventDefault()
    if (!busy && !refusal) onConfirm()
  }
  return (
    <Radix.Root open={open} onOpenChange={onOpenChange}>
      <Radix.Portal>
        <div className="fixed inset-0 z-40 bg-[rgb(21_24_27/0.45)]" aria-hidden />
        <Radix.Content
          data-modal=""
          onOpenAutoFocus={() => {
            opener.current = document.activeElement
          }}
          onCloseAutoFocus={(event) => {
            event.preventDefault()
            if (opener.current instanceof HTMLElement) opener.current.focus()
          }}
          className="rise fixed top-1/2 left-1/2 z-50 max-h-[calc(100dvh-32px)] w-[calc(100vw-32px)] max-w-dialog -translate-x-1/2 -translate-y-1/2 overflow-y-auto rounded border border-ink bg-sheet p-6 shadow-float"
        >
          <form onSubmit={submit}>
            <Radix.Title className="mb-2 text-20 font-medium">{title}</Radix.Title>
            <Radix.Description asChild>
              <div className="grid gap-4">{children}</div>
            </Radix.Description>
            {error && <p role="alert" className="mt-4 text-red">{error}</p>}
            <div className="mt-6 flex flex-wrap justify-end gap-3">
              <Radix.Close asChild><Button kind="soft">{cancel}</Button></Radix.Close>
              <Button kind={danger ? 'danger' : 'main'} type="submit" busy={busy} refusal={refusal} refusalAt="before">{confirm}</Button>
            </div>
          </form>
        </Radix.Content>
      </Radix.Portal>
    </Radix.Root>
  )
}
