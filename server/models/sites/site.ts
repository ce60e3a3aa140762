import { text } from '../../database/columns.ts'
import { table, type Row } from '../../database/table.ts'

export const Site = table('Site', 'sites', {
  name: text(), address: text(), timeZone: text(),
})
export type Site = Row<typeof Site>
