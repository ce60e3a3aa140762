import { ref, text } from '../../database/columns.ts'
import { table, type Row } from '../../database/table.ts'

export const Message = table('Message', 'messages', {
  jobId: ref(), customerId: ref(), siteId: ref(), byId: ref(), text: text(),
})
export type Message = Row<typeof Message>
