import type { Right } from '../../../shared/api/words.ts'
import { day, ref, text } from '../../database/columns.ts'
import { table, type Row } from '../../database/table.ts'

export const Authorisation = table('Authorisation', 'authorisations', {
  personId: ref(), siteId: ref(), methodId: text(), right: text<Right>(), until: day(), evidence: text(),
})
export type Authorisation = Row<typeof Authorisation>
