import { big, instant, ref } from '../../database/columns.ts'
import { table, type Row } from '../../database/table.ts'

/** When a site's plan was last made, and up to which event of the ledger it knows. */
export const Plan = table('Plan', 'plans', { siteId: ref(), madeAt: instant(), ledgerId: big() })
export type Plan = Row<typeof Plan>
