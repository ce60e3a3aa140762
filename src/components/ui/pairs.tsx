import type { ReactNode } from 'react'
import { classNames } from './class-names.ts'

/** Names and values. `plain` side by side; `ruled` with a hairline each and values at the right, as beside a result; `sum` makes the last one a total. */
export function Pairs({ items, look = 'plain', sum = false, className }: { items: readonly (readonly [name: ReactNode, value: ReactNode])[]; look?: 'plain' | 'ruled'; sum?: boolean; className?: string }) {
  if (look === 'plain') {
    return (
      <dl className={classNames('grid grid-cols-[max-content_1fr] gap-x-4 gap-y-1', className)}>
        {items.map(([name, value], place) => <div key={place} className="contents"><dt className="text-quiet">{name}</dt><dd className="min-w-0">{value}</dd></div>)}
      </dl>
    )
  }
  return (
    <dl className={className}>
      {items.map(([name, value], place) => {
        const total = sum && place === items.length - 1
        return (
          <div key={place} className={classNames('flex justify-between gap-4 border-t py-1', total ? 'mt-1.5 border-ink pt-2 text-17 font-bold' : 'border-line')}>
            <dt className={total ? undefined : 'text-quiet'}>{name}</dt>
            <dd className="text-right">{value}</dd>
          </div>
        )
      })}
    </dl>
  )
}
