import { flag, maybe, ref, text } from '../../../server/database/columns.ts'
import { table, type Row } from '../../../server/database/table.ts'

/** A table with every column that rules look at; those that only a `can` rule names may be empty. */
export function tableFor(name: string, tableName: string) {
  return table(name, tableName, { customerId: maybe(ref()), siteId: maybe(ref()), performedById: ref(), personId: maybe(ref()), visibleToCustomer: flag(), role: text(), state: text() })
}
export type Kept = Row<ReturnType<typeof tableFor>>
