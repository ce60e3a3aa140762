import type { ReactNode } from 'react'
import { classNames } from '../class-names.ts'

/** What stands beside a state: `<Flag>one sample on hold</Flag>` in amber with its two bars, `<Flag kind="late">1 day late</Flag>` in red. */
export function Flag({ kind = 'hold', children, className }: { kind?: 'hold' | 'late'; children: ReactNode; className?: string }) {
  return (
    <span className={classNames('inline-flex items-baseline gap-1.5 font-medium', kind === 'hold' ? 'text-amber' : 'text-red', className)}>
      {kind === 'hold' && <i aria-hidden className="h-2.75 w-2.25 flex-none border-x-3 border-current" />}
      {children}
    </span>
  )
}
