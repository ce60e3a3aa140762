import { useId, type ComponentPropsWithRef, type MouseEvent, type ReactNode } from 'react'
import { classNames } from '../class-names.ts'
import { Icon, type IconName } from '../icon.tsx'
import { Kbd } from '../kbd.tsx'
import { buttonLook, type ButtonLook } from './button-look.ts'

export type ButtonProps = Omit<ComponentPropsWithRef<'button'>, 'disabled'> &
  Omit<ButtonLook, 'refused'> & {
    /** Work is going on: shows a ring, takes no second press. */
    busy?: boolean
    /**
     * Why it cannot be pressed now, as a sentence. The button stays reachable by keyboard (aria-disabled) and the sentence
     * stands beside it; empty or missing means it can be pressed.
     */
    refusal?: string | false | null
    /** Where the sentence stands; `hidden` when the page already shows it elsewhere in sight. */
    refusalAt?: 'after' | 'before' | 'below' | 'hidden'
    icon?: IconName
    /** The key that does the same, shown at its right: "Ctrl Enter". Bind it with `useKeys`. */
    keys?: string
  }

/** `<Button kind="main" busy={saving.isPending} refusal={reason} onClick={…}>Place job</Button>`. Type is `button` unless given. */
export function Button({ kind, size, wide, square, busy = false, refusal, refusalAt = 'after', icon, keys, children, onClick, className, ...rest }: ButtonProps) {
  const id = useId()
  const refused = Boolean(refusal)
  const press = (event: MouseEvent<HTMLButtonElement>) => {
    if (refused || busy) event.preventDefault()
    else onClick?.(event)
  }
  const button = (
    <button
      type="button"
      {...rest}
      className={classNames(buttonLook({ kind, size, wide, square, refused }), busy && 'cursor-progress!', className)}
      onClick={press}
      {...(busy && { 'aria-busy': true })}
      {...((refused || busy) && { 'aria-disabled': true })}
      {...(refused && { 'aria-describedby': classNames(rest['aria-describedby'], id) })}
      {...(keys && { 'aria-keyshortcuts': spokenKeys(keys) })}
    >
      {busy ? <span className="busy-ring" /> : icon && <Icon name={icon} />}
      {children}
      {keys && <Kbd className={kind === 'main' && !refused ? 'border-current! text-inherit!' : undefined}>{keys}</Kbd>}
    </button>
  )
  if (!refused) return button
  return <Refused id={id} at={refusalAt} wide={wide ?? false} reason={String(refusal)}>{button}</Refused>
}

function Refused({ id, at, wide, reason, children }: { id: string; at: NonNullable<ButtonProps['refusalAt']>; wide: boolean; reason: string; children: ReactNode }) {
  const below = at === 'below' || wide
  return (
    <span className={classNames('inline-flex gap-x-3 gap-y-2', wide && 'w-full', below ? 'flex-col items-start' : 'flex-wrap items-center', at === 'before' && 'flex-row-reverse')}>
      {children}
      <span id={id} className={at === 'hidden' ? 'sr-only' : 'text-13 text-quiet'}>{reason}</span>
    </span>
  )
}

/** "Ctrl Enter" as ARIA writes it: "Control+Enter". */
function spokenKeys(keys: string): string {
  return keys.replace('Ctrl', 'Control').split(' ').join('+')
}
