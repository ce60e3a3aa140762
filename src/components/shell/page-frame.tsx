import type { ReactNode } from 'react'
import { classNames } from '../ui/class-names.ts'

/** What stands under the strip. `page`: margins and at most 1504 px. `bare`: the page sets its own (bench, floor, review). */
export function PageFrame({ strip, layout = 'page', children, className }: { strip: ReactNode; layout?: 'page' | 'bare'; children: ReactNode; className?: string }) {
  return (
    <>
      <SkipLink />
      {strip}
      <main id="main" tabIndex={-1} className={classNames('outline-none', layout === 'page' && 'mx-auto max-w-page px-gutter pt-7 pb-16 max-tablet:pt-5 max-tablet:pb-12', className)}>
        {children}
      </main>
    </>
  )
}

/** First in the order of keys: past the strip, to the page. */
function SkipLink() {
  return (
    <a href="#main" className="absolute top-2 -left-[999px] z-20 bg-ink px-4 py-2.5 text-paper focus:left-2">
      Skip to the page
    </a>
  )
}
