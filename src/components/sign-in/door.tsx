import type { ReactNode } from 'react'
import { Link } from 'react-router-dom'
import { BrandMark } from '../shell/brand-mark.tsx'
import { Plate } from './plate.tsx'

/** The way in: what is asked at the left, the picture at the right. `under` is the quiet line below the title, `foot` stands at the bottom. */
export function Door({ title, under, children, foot }: { title: string; under?: ReactNode; children: ReactNode; foot?: ReactNode }) {
  return (
    <div className="grid min-h-dvh list:grid-cols-[minmax(420px,35fr)_65fr]">
      <title>{`${title} · Crosshead`}</title>
      <main id="main" className="on-sheet flex flex-col gap-10 bg-sheet px-14 py-10 list:border-r list:border-line max-list:min-h-dvh max-tablet:px-gutter max-tablet:py-6">
        <Link to="/sign-in" aria-label="Crosshead, sign in" className="flex items-center gap-3 self-start text-[1.5rem]/8 font-medium tracking-[-.015em] no-underline">
          <BrandMark className="size-8" />
          Crosshead
        </Link>
        <div className="my-auto grid w-full max-w-[340px] gap-5 max-tablet:max-w-none [--control:2.75rem]">
          <div>
            <h1 className="text-34 font-medium tracking-[-.02em]">{title}</h1>
            {under && <p className="mt-0.5 text-quiet">{under}</p>}
          </div>
          {children}
        </div>
        <p className="max-w-[340px] text-13/5 text-quiet [&_a]:text-ink">{foot ?? <><Link to="/check">Check a report</Link> without signing in: its number and the code on its first page are enough.</>}</p>
      </main>
      <Plate />
    </div>
  )
}
