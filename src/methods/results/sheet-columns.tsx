import type { ReactNode } from 'react'

/** Readings at the left, results at the right; below 1100 px the result stands above the readings and the rest of it below them. */
export function SheetColumns({ left, result, more, side = 'wide' }: { left: ReactNode; result: ReactNode; more?: ReactNode; side?: 'wide' | 'narrow' }) {
  return (
    <div className={`grid flex-1 content-start gap-x-12 px-10 py-5 max-desk:flex max-desk:flex-col max-desk:px-gutter ${side === 'wide' ? 'grid-cols-[minmax(0,1fr)_340px]' : 'grid-cols-[minmax(0,1fr)_320px] gap-x-10!'}`}>
      <div className="min-w-0 max-desk:order-2">{left}</div>
      <aside aria-label="Results" className="min-w-0 max-desk:contents">
        <div aria-live="polite" className="max-desk:order-1 max-desk:mb-4">{result}</div>
        {more && <div className="max-desk:order-3 max-desk:mt-6 max-desk:grid max-desk:grid-cols-2 max-desk:items-start max-desk:gap-x-8">{more}</div>}
      </aside>
    </div>
  )
}
