import { integer, text } from '../../database/columns.ts'
import { table, type Row } from '../../database/table.ts'

export const Company = table('Company', 'company', {
  name: text(), address: text(), email: text(), taxPercent: integer(),
})
export type Company = Row<typeof Company>
