import type { ReactNode } from 'react'
import { Icon } from '../ui/icon.tsx'

/** The bar at the foot of a sheet: what is kept, what to beware of, what stands in the way, and the deeds. */
export function SheetFoot({ kept, cautions = [], stopper, stopperId, isCalm = false, children }: { kept?: ReactNode; cautions?: readonly string[]; stopper?: ReactNode; stopperId?: string; /** The stopper is no fault, only not yet. */ isCalm?: boolean; children: ReactNode }) {
  const [first] = cautions
  return (
    <footer className="sticky bottom-0 z-2 flex items-center justify-between gap-6 border-t border-line bg-paper px-10 py-3 text-13 [--ground:var(--paper)] max-desk:gap-4 max-desk:px-gutter max-desk:py-2.5 max-tablet:flex-wrap">
      {kept}
      {first && (
        <details className="relative mx-auto min-w-0 max-w-115 max-desk:mx-0 max-desk:flex-none">
          <summary className="flex cursor-pointer items-center gap-2 py-1">
            <Icon name="warning" className="text-amber" />
            <span className="font-medium max-desk:hidden"><span className="line-clamp-2">{first}</span></span>
            <span className="whitespace-nowrap underline underline-offset-3"><span className="max-desk:hidden">all {cautions.length}</span><span className="desk:hidden">Cautions</span></span>
          </summary>
          <ul className="on-sheet absolute bottom-full left-0 mb-3 grid w-[min(460px,80vw)] gap-2 rounded border border-ink bg-sheet p-4 shadow-float">{cautions.map((caution) => <li key={caution}>{caution}</li>)}</ul>
        </details>
      )}
      <div className="flex min-w-0 flex-1 items-center justify-end gap-3 [&>:not([role=status])]:flex-none">
        {stopper && <span id={stopperId} role="status" className={`max-w-70 min-w-0 text-right desk:min-w-60 font-medium ${isCalm ? 'text-quiet' : 'text-red'}`}>{stopper}</span>}
        {children}
      </div>
    </footer>
  )
}
