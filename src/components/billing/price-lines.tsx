import type { Quote } from '../../../shared/api/orders.ts'
import { formatAmount } from '../../lib/format.ts'

/** The lines of a price, tax and the total below them. The currency stands in the section's head. */
export function PriceLines({ lines, netMinor, taxMinor, totalMinor, currency, tax = 'Tax', total = 'Total' }: Pick<Quote, 'lines' | 'netMinor' | 'taxMinor' | 'totalMinor' | 'currency'> & { /** "Tax 20 %" where the rate is known. */ tax?: string; total?: string }) {
  const say = (minor: number) => formatAmount(minor, currency)
  return (
    <dl className="mb-2.5">
      {lines.map(({ name, count, unitMinor, totalMinor: line }, place) => (
        <div key={place} className="flex justify-between gap-3 py-0.75"><dt>{name} <span className="ml-2 whitespace-nowrap text-quiet">{count} × {say(unitMinor)}</span></dt><dd>{say(line)}</dd></div>
      ))}
      <div className="mt-1.5 flex justify-between gap-3 border-t border-line pt-2 pb-0.75"><dt>Before tax</dt><dd>{say(netMinor)}</dd></div>
      <div className="flex justify-between gap-3 py-0.75"><dt>{tax}</dt><dd>{say(taxMinor)}</dd></div>
      <div className="mt-1.5 flex justify-between gap-3 border-t border-ink pt-2 text-17 font-bold"><dt>{total}</dt><dd>{say(totalMinor)}</dd></div>
    </dl>
  )
}
