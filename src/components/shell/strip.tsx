import type { ReactNode } from 'react'
import { Link } from 'react-router-dom'
import { ScanField } from '../ui/fields/scan-field.tsx'
import { BrandMark } from './brand-mark.tsx'
import { MeMenu } from './me-menu.tsx'
import type { StripPage } from './strip-page.ts'

export type StripProps = {
  /** Site or organisation, and after it the bench. */
  here: string
  hereDetail?: string
  /** The pages of my role, in order. */
  pages: readonly StripPage[]
  me: { name: string; detail?: string; links?: readonly StripPage[] }
  onSignOut: () => void
  /** A scanner's burst; left out where nothing can be scanned. */
  onScan?: (code: string) => void
  onSearch?: (text: string) => void
  scanBusy?: boolean
}

/** The one strip across the top: mark, where I am, the field for a scan or a search, the pages of my role, me. */
export function Strip({ here, hereDetail, pages, me, onSignOut, onScan, onSearch, scanBusy }: StripProps) {
  return (
    <StripBar here={here} hereDetail={hereDetail}>
      {onScan && <ScanField folds onScan={onScan} onSearch={onSearch} busy={scanBusy} className="my-auto tablet:grow-0 tablet:basis-[380px] tablet:max-wide:grow" />}
      <nav aria-label="Pages" className="ml-auto flex items-stretch gap-0.5 max-wide:hidden">
        {pages.map((page) => (
          <Link key={page.to} to={page.to} aria-current={page.current ? 'page' : undefined} className="relative flex items-center px-3 text-quiet no-underline hover:text-ink aria-[current]:font-medium aria-[current]:text-ink aria-[current]:after:absolute aria-[current]:after:inset-x-3 aria-[current]:after:-bottom-px aria-[current]:after:h-0.75 aria-[current]:after:bg-ink">
            {page.label}
            {page.count !== undefined && page.count > 0 && <span className="ml-1.5 text-13 font-normal text-quiet">{page.count}</span>}
          </Link>
        ))}
      </nav>
      <span className="flex items-stretch max-wide:ml-auto max-wide:has-[+*]:ml-0 max-tablet:ml-0">
        <MeMenu name={me.name} detail={me.detail} links={me.links} pages={pages} onSignOut={onSignOut} />
      </span>
    </StripBar>
  )
}

/** The strip for people who are not signed in: mark, the lab's name, and what stands at the right. */
export function StripBar({ here, hereDetail, home = '/', children }: { here: string; hereDetail?: string; home?: string; children?: ReactNode }) {
  return (
    <header className="not-printed relative flex h-14 items-stretch gap-6 border-b border-line bg-paper px-gutter max-wide:gap-4 max-tablet:h-13 max-tablet:gap-3">
      <Link to={home} aria-label="Crosshead, first page" className="flex items-center gap-2.5 text-[1.125rem] font-medium tracking-[-.015em] no-underline">
        <BrandMark />
        <span className="max-desk:hidden">Crosshead</span>
      </Link>
      <span className="relative flex min-w-0 items-center gap-2 pl-6 whitespace-nowrap before:absolute before:inset-y-4.5 before:left-0 before:w-px before:bg-line max-tablet:pl-3">
        <span className="truncate">{here}</span>
        {hereDetail && <span className="truncate text-quiet">{hereDetail}</span>}
      </span>
      {children}
    </header>
  )
}
