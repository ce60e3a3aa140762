import { Op, type Transaction } from 'sequelize'
import { benchRole } from '../../../shared/access/bench-role.ts'
import type { Shop } from '../../../shared/routing/shop.ts'
import { Authorisation } from '../../models/people/authorisation.ts'
import { Person } from '../../models/people/person.ts'
import { Bench } from '../../models/sites/bench.ts'
import { Equipment } from '../../models/sites/equipment.ts'
import type { Site } from '../../models/sites/site.ts'
import { latestVerifications } from '../equipment/latest-verifications.ts'
import { endOfDay, openIntervals } from './plan-clock.ts'

/** How far ahead a plan reaches, in minutes. */
export const horizonMinutes = 28 * 24 * 60
/** Steps that start this soon keep their place. */
export const frozenMinutes = 240

/** Kinds of preparation that every technician of a site may do; a measurement needs an authorisation for its method. */
const preparation = ['section', 'machine', 'mount', 'grind and polish', 'etch']

/** Which of our records stands behind a name in the plan. Names read well in the planner's sentences. */
export type Names = { benches: Map<string, string>; people: Map<string, string> }
export type Frame = { shop: Omit<Shop, 'jobs' | 'samples' | 'steps'>; names: Names }

/** Benches, people and hours of one site as the planner wants them, with nothing to do yet. */
export async function shopOfSite(site: Site, now: number, tx?: Transaction): Promise<Frame> {
  const horizon = now + horizonMinutes
  const where = { siteId: site.id }
  const benches = await Bench.findAll({ where, raw: true, order: [['code', 'ASC']], transaction: tx })
  const equipment = new Map((await Equipment.findAll({ where, raw: true, transaction: tx })).map((one) => [one.id, one]))
  const verified = await latestVerifications([...equipment.keys()], tx)
  const people = await Person.findAll({ where: { siteId: site.id, role: benchRole, state: 'active' }, raw: true, order: [['id', 'ASC']], transaction: tx })
  const rights = await Authorisation.findAll({ where: { personId: { [Op.in]: people.map(({ id }) => id) }, right: 'carry out' }, raw: true, transaction: tx })

  const benchName = naming(benches.map(({ id, name, code }) => ({ id, name, also: code })))
  const personName = naming(people.map(({ id, name, email }) => ({ id, name, also: email })))
  const open = openIntervals(site.hours, site.timeZone, now - 24 * 60, horizon)
  return {
    names: { benches: reversed(benchName), people: reversed(personName) },
    shop: {
      now, frozenMinutes, horizon, effort: 2000,
      sites: [{ id: site.name, scope: [], courier: [] }],
      benches: benches.map((bench) => {
        const machine = bench.equipmentId ? equipment.get(bench.equipmentId) : undefined
        const failed = machine ? verified.get(machine.id)?.passed === false : false
        return {
          id: benchName.get(bench.id)!, site: site.name, units: bench.units, open: openIntervals(bench.hours, site.timeZone, now - 24 * 60, horizon), does: bench.does,
          usableUntil: machine?.calibratedUntil ? endOfDay(machine.calibratedUntil, site.timeZone) : horizon, out: bench.out || machine?.outOfUse === true || failed,
        }
      }),
      people: people.map(({ id }) => ({
        id: personName.get(id)!, site: site.name, open,
        may: [...preparation.map((kind) => ({ kind, until: horizon })), ...lastUntil(rights.filter(({ personId }) => personId === id), site.timeZone)],
      })),
    },
  }
}

/** A person's latest end for each method. */
function lastUntil(rights: { methodId: string; until: string }[], timeZone: string): { kind: string; until: number }[] {
  const latest = new Map<string, string>()
  for (const { methodId, until } of rights) if (until > (latest.get(methodId) ?? '')) latest.set(methodId, until)
  return [...latest].map(([kind, until]) => ({ kind, until: endOfDay(until, timeZone) }))
}

/** A readable name for each id: the plain name where it is the only one, with its code beside it otherwise. */
function naming(things: { id: string; name: string; also: string }[]): Map<string, string> {
  return new Map(things.map(({ id, name, also }) => [id, things.filter((other) => other.name === name).length > 1 ? `${name} (${also})` : name]))
}
const reversed = (names: Map<string, string>) => new Map([...names].map(([id, name]) => [name, id]))
