import type { Caller } from '../../caller.ts'
import { accessibleWhere } from '../../models/accessible.ts'
import { Equipment } from '../../models/sites/equipment.ts'
import { equipmentViews } from './equipment-view.ts'

/** The machines that the caller may see, by code. */
export async function listEquipment(caller: Caller) {
  const where = accessibleWhere(caller.ability, 'read', 'Equipment')
  if (!where) return { items: [] }
  const ids = (await Equipment.findAll({ where, attributes: ['id'], raw: true })).map(({ id }) => id)
  return { items: [...(await equipmentViews(ids)).values()] }
}
