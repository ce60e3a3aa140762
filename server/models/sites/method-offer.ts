import type { Currency } from '../../../shared/api/words.ts'
import { integer, json, text } from '../../database/columns.ts'
import { table, type Row } from '../../database/table.ts'

export const MethodOffer = table('MethodOffer', 'method_offers', {
  methodId: text(), priceMinor: integer(), currency: text<Currency>(), siteIds: json<string[]>(),
})
export type MethodOffer = Row<typeof MethodOffer>
