import type { ReactNode } from 'react'
import type { Order, Quote } from '../../../../shared/api/orders.ts'
import type { TravellerNode } from '../../../../shared/api/basics.ts'
import { orderedTests } from '../../../../shared/orders/ordered-test.ts'
import { travellerSteps } from '../../../../shared/orders/traveller-steps.ts'
import { currencySign, formatDay, formatTime } from '../../../lib/format.ts'
import { PriceLines } from '../../billing/price-lines.tsx'
import { SectionHead } from '../../ui/section-head.tsx'
import { RadioGroup } from '../../ui/fields/radio-group.tsx'
import { TravellerLine, type LineNode } from '../../ui/traveller/traveller-line.tsx'
import { dayOf, days, daysBetween } from '../list/due-words.ts'

/** What is promised for the order as it stands, where it would be done, and what it costs; `children` stand below the price. */
export function PromisePanel({ order, quote, at, working, zone, onSite, children }: {
  order: Order
  quote: Quote | undefined
  /** When the quote was given. */
  at: number
  /** A newer one is on its way. */
  working: boolean
  zone: string
  onSite: (siteId: string | null) => void
  children: ReactNode
}) {
  const promise = quote?.promise
  const out = quote?.sites.filter(({ because, finish }) => finish === null && because.startsWith('does not')) ?? []
  const able = quote?.sites.filter((site) => !out.includes(site)) ?? []
  return (
    <>
      <SectionHead title="Promise" aside={working ? 'working it out' : at > 0 && `as of ${formatTime(new Date(at), { zone })}`} />
      {promise ? (
        <>
          <p className="text-34 font-medium tracking-[-.02em]">{formatDay(promise.finish, 'week', { zone })}</p>
          <p className="text-quiet">{finishWords(order.neededBy, dayOf(promise.finish, zone))}</p>
          <TravellerLine size="m" zone={zone} nodes={promiseLine(order, promise, zone)} className="mt-4 mb-5" />
        </>
      ) : (
        <p className="mb-5 text-quiet">{!quote ? 'The earliest finish appears here.' : quote.faults.length > 0 ? 'Nothing can be promised until the order is in order.' : 'No day can be promised for this order; write to the lab.'}</p>
      )}
      {quote && able.length > 0 && (
        <RadioGroup
          legend="Where it is done" legendHidden className="mb-7" value={order.siteId ?? 'any'} onValue={(value) => onSite(value === 'any' ? null : value)}
          choices={[
            { value: 'any', label: 'Wherever it is done first', ...(promise && order.siteId === null && { hint: `${promise.siteName} at present` }) },
            ...able.map(({ siteId, name, finish, because }) => ({ value: siteId, label: <><b>{name}</b> {finish && <span className="ml-2">{formatDay(finish, 'week', { zone })}</span>}</>, ...(because && { hint: because }) })),
          ]}
        />
      )}
      {out.map(({ siteId, name, because }) => <p key={siteId} className="-mt-5 mb-7 text-13 text-quiet">{name} is out: it {because}.</p>)}
      {quote && (
        <>
          <SectionHead title="Price" aside={currencySign(quote.currency)} />
          <PriceLines {...quote} tax={`Tax ${quote.taxPercent} %`} />
        </>
      )}
      {children}
    </>
  )
}

function finishWords(neededBy: string | null, finish: string): string {
  if (!neededBy) return 'earliest finish'
  const spare = daysBetween(finish, neededBy)
  if (spare === 0) return 'earliest finish, on the day you need it'
  return spare > 0 ? `earliest finish, ${days(spare)} before you need it` : `earliest finish, ${days(-spare)} after you need it`
}

/** The kinds of work of the order in a line, from receiving to report. */
function promiseLine(order: Order, { finish, receiveBy }: NonNullable<Quote['promise']>, zone: string): LineNode[] {
  const kinds = new Map<string, TravellerNode['kind']>()
  for (const sample of order.samples) {
    const tests = orderedTests(order, sample).map(({ method, parameters }) => ({ needs: method && parameters ? method.needs(parameters) : [] }))
    for (const { type } of travellerSteps(tests)) kinds.set(type, type === 'measure' || type === 'pull' ? 'test' : 'prep')
  }
  const all = [...kinds].map(([label, kind]): LineNode => ({ kind, label, stage: 'in work', state: 'todo' }))
  const work = all.length > 3 ? all.filter(({ kind }) => kind === 'test') : all
  return [
    { kind: 'prep', label: 'receive', stage: 'awaiting samples', state: 'todo', note: `by ${formatDay(receiveBy, 'short', { zone })}` }, ...work.slice(0, 3),
    { kind: 'report', label: 'report', stage: 'reported', state: 'todo', note: formatDay(finish, 'short', { zone }) },
  ]
}
