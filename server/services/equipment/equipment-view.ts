import { Op } from 'sequelize'
import type { EquipmentState } from '../../../shared/api/benches.ts'
import { Equipment } from '../../models/sites/equipment.ts'
import { Site } from '../../models/sites/site.ts'
import { latestVerifications } from './latest-verifications.ts'

/** Machines with their calibration and newest verification, by id. */
export async function equipmentViews(ids: readonly string[]): Promise<Map<string, EquipmentState>> {
  const machines = await Equipment.findAll({ where: { id: { [Op.in]: [...ids] } }, raw: true, order: [['code', 'ASC']] })
  const sites = new Map((await Site.findAll({ where: { id: { [Op.in]: machines.map(({ siteId }) => siteId) } }, raw: true })).map((site) => [site.id, site.name]))
  const verified = await latestVerifications(machines.map(({ id }) => id))
  return new Map(machines.map((machine) => {
    const last = verified.get(machine.id)
    return [machine.id, {
      id: machine.id, code: machine.code, name: machine.name, kind: machine.type, siteId: machine.siteId, siteName: sites.get(machine.siteId) ?? '', calibratedUntil: machine.calibratedUntil,
      certificate: machine.certificate, outOfUse: machine.outOfUse, lastVerification: last ? { at: last.at.toISOString(), passed: last.passed, text: last.text } : null,
    }]
  }))
}
