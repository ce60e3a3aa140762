import { day, fallback, flag, maybe, ref, text } from '../../database/columns.ts'
import { table, type Row } from '../../database/table.ts'

export const Equipment = table('Equipment', 'equipment', {
  siteId: ref(), code: text(), name: text(), type: text(), calibratedUntil: maybe(day()), certificate: text(), outOfUse: fallback(flag(), false),
})
export type Equipment = Row<typeof Equipment>
