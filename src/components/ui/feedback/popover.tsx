import * as Radix from '@radix-ui/react-popover'
import type { ReactNode } from 'react'
import { classNames } from '../class-names.ts'
import { IconButton } from '../buttons/icon-button.tsx'

/**
 * Floats beside what opened it: `<Popover trigger={<Button>Why then</Button>} label="Why then">…</Popover>`.
 * `Esc` or a press outside closes it and focus goes back. Can be driven by `open` and `onOpenChange`.
 */
export function Popover({ trigger, label, children, open, onOpenChange, side = 'bottom', align = 'start', className }: {
  /** A button; it gets aria-expanded and the press. */
  trigger: ReactNode
  label: string
  children: ReactNode
  open?: boolean
  onOpenChange?: (open: boolean) => void
  side?: 'top' | 'right' | 'bottom' | 'left'
  align?: 'start' | 'center' | 'end'
  className?: string
}) {
  return (
    <Radix.Root open={open} onOpenChange={onOpenChange}>
      <Radix.Trigger asChild>{trigger}</Radix.Trigger>
      <Radix.Portal>
        <Radix.Content aria-label={label} side={side} align={align} sideOffset={8} collisionPadding={12} className={classNames('on-sheet rise z-30 max-h-(--radix-popover-content-available-height) w-[min(408px,calc(100vw-24px))] overflow-y-auto rounded border border-ink bg-sheet px-4 py-3.5 shadow-float', className)}>
          <Radix.Close asChild><IconButton icon="cross" label="Close" className="float-right -mt-2 -mr-2.5" /></Radix.Close>
          {children}
        </Radix.Content>
      </Radix.Portal>
    </Radix.Root>
  )
}
