import type { Currency } from '../../../shared/api/words.ts'
import { text } from '../../database/columns.ts'
import { table, type Row } from '../../database/table.ts'

export const Customer = table('Customer', 'customers', {
  name: text(), address: text(), reportEmail: text(), currency: text<Currency>(),
})
export type Customer = Row<typeof Customer>
