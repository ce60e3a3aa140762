import type { Bench as BenchView } from '../../../shared/api/benches.ts'
import { methodOf } from '../../../shared/methods.ts'
import type { Bench } from '../../models/sites/bench.ts'
import { Site } from '../../models/sites/site.ts'
import { equipmentViews } from '../equipment/equipment-view.ts'

/** Benches with their site and machine, in the order given. */
export async function benchViews(benches: readonly Bench[]): Promise<BenchView[]> {
  const sites = new Map((await Site.findAll({ raw: true })).map(({ id, name }) => [id, name]))
  const machines = await equipmentViews(benches.flatMap(({ equipmentId }) => (equipmentId ? [equipmentId] : [])))
  return benches.map(({ id, siteId, name, code, units, out, does, equipmentId }) => ({
    id, siteId, siteName: sites.get(siteId) ?? '', name, code, units, out, does: does.map((ability) => ({ ...ability, label: methodOf(ability.kind)?.title ?? ability.kind })), equipment: equipmentId ? (machines.get(equipmentId) ?? null) : null,
  }))
}
