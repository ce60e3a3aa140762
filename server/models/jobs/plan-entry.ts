import { instant, json, maybe, ref, text } from '../../database/columns.ts'
import { table, type Row } from '../../database/table.ts'

export const PlanEntry = table('PlanEntry', 'plan_entries', {
  stepId: ref(), siteId: ref(), benchId: maybe(ref()), personId: maybe(ref()), startsAt: maybe(instant()), endsAt: maybe(instant()), why: text(), rejected: json<{ bench: string; because: string }[]>(),
  unplacedBecause: maybe(text()), cures: json<string[]>(),
})
export type PlanEntry = Row<typeof PlanEntry>
