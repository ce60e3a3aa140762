import type { Caller } from '../../caller.ts'
import { accessibleWhere } from '../../models/accessible.ts'
import { Bench } from '../../models/sites/bench.ts'
import { benchViews } from './bench-views.ts'

/** The benches of the caller's sites, by code. */
export async function listBenches(caller: Caller) {
  const where = accessibleWhere(caller.ability, 'read', 'Bench')
  return { items: where ? await benchViews(await Bench.findAll({ where, order: [['code', 'ASC']], raw: true })) : [] }
}
