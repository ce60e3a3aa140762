import { big, flag, instant, maybe, ref, text } from '../../database/columns.ts'
import { table, type Row } from '../../database/table.ts'

export const File = table('File', 'files', {
  jobId: ref(), sampleId: maybe(ref()), testRunId: maybe(ref()), customerId: ref(), siteId: ref(), visibleToCustomer: flag(), purpose: text<'attachment' | 'photo' | 'record' | 'report'>(), name: text(), mediaType: text(),
  size: big(), sha256: text(), storeKey: text(), displayKey: maybe(text()), byId: maybe(ref()), removedAt: maybe(instant()),
})
export type File = Row<typeof File>
