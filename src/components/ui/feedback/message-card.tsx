import type { ReactNode } from 'react'
import { classNames } from '../class-names.ts'
import { Icon, type IconName } from '../icon.tsx'

/** The sheet that stands in place of content: nothing there yet, refused, failed. Says what to do first. */
export function MessageCard({ icon, title, children, action, busy, role, className }: {
  icon?: IconName
  title: ReactNode
  children?: ReactNode
  action?: ReactNode
  busy?: boolean
  role?: 'alert' | 'status'
  className?: string
}) {
  return (
    <div role={role} aria-busy={busy ? true : undefined} className={classNames('on-sheet flex max-w-[560px] flex-col items-start gap-2 border border-line bg-sheet p-4', className)}>
      <p className="flex gap-2 text-15 font-medium">
        {icon && <Icon name={icon} className="mt-0.75" />}
        {title}
      </p>
      {children && <div className="w-full text-13">{children}</div>}
      {action && <div className="mt-1 flex flex-wrap gap-2">{action}</div>}
    </div>
  )
}
