import type { ReactNode } from 'react'
import { Link } from 'react-router-dom'

/**
 * The head of a page: the title is what it shows ("Job J-26-00417 for Brackwater Forge"), one main action at the right.
 * `crumb` leads back to its list, `under` is the quiet line below (state, flags, order, date), as children side by side.
 */
export function PageTitle({ title, crumb, under, actions }: { title: ReactNode; crumb?: { to: string; label: string }; under?: ReactNode; actions?: ReactNode }) {
  return (
    <div className="mb-6 flex items-end gap-6 max-tablet:mb-5 max-tablet:flex-wrap max-tablet:gap-3">
      <div className="min-w-0 flex-1 max-tablet:basis-full">
        {crumb && <p className="mb-1.5 text-13 text-quiet"><Link to={crumb.to}>{crumb.label}</Link></p>}
        <h1 className="text-26 font-medium tracking-[-.014em] max-tablet:text-[1.5rem]/[1.875rem]">{title}</h1>
        {under && <div className="mt-2 flex flex-wrap items-center gap-x-5 gap-y-1.5 text-quiet">{under}</div>}
      </div>
      {actions && <div className="flex flex-wrap items-center justify-end gap-3 max-tablet:w-full max-tablet:justify-start max-tablet:gap-2">{actions}</div>}
    </div>
  )
}
