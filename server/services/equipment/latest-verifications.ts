import { QueryTypes, type Transaction } from 'sequelize'
import { database } from '../../database/connection.ts'

export type LatestVerification = { at: Date; passed: boolean; text: string }

/** The newest verification of each machine that has one. */
export async function latestVerifications(equipmentIds: readonly string[], tx?: Transaction): Promise<Map<string, LatestVerification>> {
  if (equipmentIds.length === 0) return new Map()
  const rows = await database.query<LatestVerification & { equipmentId: string }>(
    'select distinct on (equipment_id) equipment_id as "equipmentId", at, passed, text from verifications where equipment_id = any($1::uuid[]) order by equipment_id, at desc',
    { bind: [equipmentIds], type: QueryTypes.SELECT, transaction: tx },
  )
  return new Map(rows.map(({ equipmentId, ...rest }) => [equipmentId, rest]))
}
