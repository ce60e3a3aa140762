import { NavLink } from 'react-router-dom'

/** Parts of one thing, each with its own address: `<Tabs label="Parts of the job" tabs={[{ to: '.', label: 'Samples' }]} />`. */
export function Tabs({ label, tabs }: { label: string; tabs: readonly { to: string; label: string; count?: number; end?: boolean }[] }) {
  return (
    <nav aria-label={label} className="mb-6 flex gap-6 overflow-x-auto border-b border-line">
      {tabs.map((tab) => (
        <NavLink key={tab.to} to={tab.to} end={tab.end ?? true} className="relative pt-2 pb-2.25 whitespace-nowrap text-quiet no-underline hover:text-ink aria-[current]:font-medium aria-[current]:text-ink aria-[current]:shadow-[inset_0_-3px_var(--ink)]">
          {tab.label}
          {tab.count !== undefined && <span className="ml-1.5 text-13 font-normal text-quiet">{tab.count}</span>}
        </NavLink>
      ))}
    </nav>
  )
}
