import type { ReactNode } from 'react'
import { classNames } from '../class-names.ts'
import { Icon, type IconName } from '../icon.tsx'

const looks = {
  plain: { box: 'border-edge bg-wash', icon: '', name: 'info' },
  warn: { box: 'border-amber bg-amber-wash', icon: 'text-amber', name: 'warning' },
  bad: { box: 'border-red bg-red-wash', icon: 'text-red', name: 'stop' },
} as const

/**
 * A bar at the left and a sign: `bad` for broken rules, `warn` for cautions and what is approximate.
 * `title` is its first words in bold, `actions` the way out as tiny buttons. `bad` is announced when it appears; `live` says others too.
 */
export function Note({ kind = 'plain', title, icon, actions, live, children, className, id }: {
  kind?: 'plain' | 'warn' | 'bad'
  title?: ReactNode
  icon?: IconName
  actions?: ReactNode
  live?: boolean
  children?: ReactNode
  className?: string
  id?: string
}) {
  const look = looks[kind]
  return (
    <div id={id} role={kind === 'bad' ? 'alert' : live ? 'status' : undefined} className={classNames('flex gap-2.5 border-l-3 px-3 py-2.5', look.box, className)}>
      <Icon name={icon ?? look.name} className={classNames('mt-0.75', look.icon)} />
      <div className="min-w-0 flex-1">
        {title && <b>{title}</b>} {children}
        {actions && <div className="mt-2 flex flex-wrap gap-2">{actions}</div>}
      </div>
    </div>
  )
}
