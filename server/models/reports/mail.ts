import { instant, maybe, text } from '../../database/columns.ts'
import { table, type Row } from '../../database/table.ts'

export const Mail = table('Mail', 'mails', {
  key: text(), recipient: text(), subject: text(), state: text<'sending' | 'sent'>(), claimedAt: instant(), sentAt: maybe(instant()),
})
export type Mail = Row<typeof Mail>
