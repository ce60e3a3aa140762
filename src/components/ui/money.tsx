import { formatMoney } from '../../lib/format.ts'

/** An amount in minor units of its currency: `<Money minor={95760} currency="GBP" />`. */
export function Money({ minor, currency, className }: { minor: number; currency: string; className?: string }) {
  return <data value={minor} className={`whitespace-nowrap ${className ?? ''}`}>{formatMoney(minor, currency)}</data>
}
