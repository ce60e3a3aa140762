import type { BenchAbility, WeekHours } from '../../../shared/planning/bench-hours.ts'
import { fallback, flag, integer, json, maybe, ref, text } from '../../database/columns.ts'
import { table, type Row } from '../../database/table.ts'

export const Bench = table('Bench', 'benches', {
  siteId: ref(), name: text(), code: text(), units: integer(), does: json<BenchAbility[]>(), hours: json<WeekHours>(), out: fallback(flag(), false), equipmentId: maybe(ref()),
})
export type Bench = Row<typeof Bench>
