import { DateTime } from 'luxon'
import { hashPassword } from '../../services/people/password/hash-password.ts'
import { inTransaction, type Tx } from '../transaction.ts'
import { Authorisation } from '../../models/people/authorisation.ts'
import { Company } from '../../models/people/company.ts'
import { Customer } from '../../models/people/customer.ts'
import { Person } from '../../models/people/person.ts'
import { Bench } from '../../models/sites/bench.ts'
import { Equipment } from '../../models/sites/equipment.ts'
import { MethodOffer } from '../../models/sites/method-offer.ts'
import { Site } from '../../models/sites/site.ts'
import { Verification } from '../../models/sites/verification.ts'
import { methods } from '../../../shared/methods.ts'
import { benches, company, offers, sites, type DemoBench } from './demo-house.ts'
import { customers, demoPassword, people } from './demo-people.ts'

type Ids = Map<string, string>

/** Makes company, sites, benches, machines, customers and accounts; false when there is a company already. */
export async function makeHouse(): Promise<boolean> {
  if ((await Company.count()) > 0) return false
  const passwordHash = await hashPassword(demoPassword)
  await inTransaction({ person: null, requestId: 'seed' }, async (tx) => {
    await Company.create(company, { transaction: tx })
    const siteIds: Ids = new Map()
    for (const { key, ...site } of sites) siteIds.set(key, (await Site.create(site, { transaction: tx })).get('id'))
    for (const bench of benches) await makeBench(bench, siteIds.get(bench.site)!, tx)
    for (const { methodId, priceMinor, sites: where } of offers) await MethodOffer.create({ methodId, priceMinor, currency: 'GBP', siteIds: where.map((key) => siteIds.get(key)!) }, { transaction: tx })
    const customerIds: Ids = new Map()
    for (const { key, ...customer } of customers) customerIds.set(key, (await Customer.create({ ...customer, currency: 'GBP' }, { transaction: tx })).get('id'))
    await makePeople(passwordHash, siteIds, customerIds, tx)
  })
  return true
}

async function makeBench({ machine, site: _site, ...bench }: DemoBench, siteId: string, tx: Tx): Promise<void> {
  const today = DateTime.utc()
  let equipmentId: string | null = null
  if (machine) {
    const { days, verified, text, ...about } = machine
    equipmentId = (await Equipment.create({ ...about, siteId, calibratedUntil: today.plus({ days }).toISODate() }, { transaction: tx })).get('id')
    if (verified) await Verification.create({ equipmentId, siteId, at: today.startOf('day').plus({ hours: 7, minutes: 52 }).minus({ days: 1 }).toJSDate(), passed: verified === 'passed', text }, { transaction: tx })
  }
  await Bench.create({ ...bench, siteId, equipmentId }, { transaction: tx })
}

async function makePeople(passwordHash: string, siteIds: Ids, customerIds: Ids, tx: Tx): Promise<void> {
  const until = DateTime.utc().plus({ months: 20 }).endOf('month').toISODate()
  for (const person of people) {
    const siteId = person.role === 'client' || !person.site ? null : siteIds.get(person.site)!
    const { email, name, role } = person
    const id = (await Person.create({ email, name, role, state: 'active', passwordHash, siteId, customerId: person.role === 'client' ? customerIds.get(person.customer)! : null }, { transaction: tx })).get('id')
    if (person.role === 'client') continue
    for (const method of methods) {
      for (const right of person.rights) await Authorisation.create({ personId: id, siteId: siteId ?? siteIds.get('T')!, methodId: method.id, right, until, evidence: 'trial with a reference piece, witnessed' }, { transaction: tx })
    }
  }
}
