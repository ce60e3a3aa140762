import { randomUUID } from 'node:crypto'
import { Authorisation } from '../../../server/models/people/authorisation.ts'
import type { Person } from '../../../server/models/people/person.ts'
import { Bench } from '../../../server/models/sites/bench.ts'
import { Equipment } from '../../../server/models/sites/equipment.ts'
import { Verification } from '../../../server/models/sites/verification.ts'
import type { Right } from '../../../shared/api/words.ts'
import { usualHours, type BenchAbility } from '../../../shared/planning/bench-hours.ts'

const mark = () => randomUUID().slice(0, 8).toUpperCase()

/** Within what the tests' Rockwell bench takes: every force of the regular scales. */
export const hardnessAbility: BenchAbility = { kind: 'rockwell', limits: { forceKgf: [15, 150], diameterMm: [3, 400] } }

/** A bench that is open Monday to Friday from half past seven to five; `does` names kinds without limits. */
export async function buildBench(siteId: string, does: readonly (string | BenchAbility)[], wanted: Partial<Pick<Bench, 'name' | 'units' | 'hours' | 'out' | 'equipmentId'>> = {}): Promise<Bench> {
  const code = `B-${mark()}`
  const abilities = does.map((one): BenchAbility => (typeof one === 'string' ? { kind: one, limits: {} } : one))
  return (await Bench.create({ siteId, code, name: `Bench ${code}`, units: 1, hours: usualHours, does: abilities, ...wanted })).get({ plain: true })
}

/** A machine in use whose calibration lasts, and which passed its last verification. */
export async function buildMachine(siteId: string, wanted: Partial<Pick<Equipment, 'calibratedUntil' | 'outOfUse'>> = {}): Promise<Equipment> {
  const code = `HT-${mark()}`
  const machine = (await Equipment.create({ siteId, code, name: 'Hardness tester', type: 'hardness tester', certificate: `TC-${code}`, calibratedUntil: '2099-12-31', ...wanted })).get({ plain: true })
  await buildVerification(machine, { passed: true, at: new Date(Date.now() - 24 * 3600_000) })
  return machine
}

export async function buildVerification({ id: equipmentId, siteId }: Pick<Equipment, 'id' | 'siteId'>, { passed, at = new Date() }: { passed: boolean; at?: Date }): Promise<void> {
  await Verification.create({ equipmentId, siteId, at, passed, text: passed ? 'block 30.4 HRC read as 30.5 HRC' : 'block 62.1 HRC read as 63.4 HRC' })
}

/** Lets a person do something with a method up to a day. */
export async function buildRight({ id: personId }: Pick<Person, 'id'>, siteId: string, right: Right, wanted: { methodId?: string; until?: string } = {}): Promise<void> {
  await Authorisation.create({ personId, siteId, right, methodId: wanted.methodId ?? 'rockwell', until: wanted.until ?? '2099-12-31', evidence: 'trial with a reference piece, witnessed' })
}
