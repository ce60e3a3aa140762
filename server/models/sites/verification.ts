import { flag, instant, ref, text } from '../../database/columns.ts'
import { table, type Row } from '../../database/table.ts'

export const Verification = table('Verification', 'verifications', {
  equipmentId: ref(), siteId: ref(), at: instant(), passed: flag(), text: text(),
})
export type Verification = Row<typeof Verification>
