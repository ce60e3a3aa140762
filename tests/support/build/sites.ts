import { randomUUID } from 'node:crypto'
import { Company } from '../../../server/models/people/company.ts'
import { Site } from '../../../server/models/sites/site.ts'

/** The lab company; there is one. */
export async function buildCompany(): Promise<Company> {
  const known = await Company.findOne({ raw: true })
  if (known) return known
  return (await Company.create({ name: 'Tarnwick Materials Testing', address: '1 Quay Road, Tarnwick', email: 'lab@tarnwick.example', taxPercent: 20 })).get({ plain: true })
}

export async function buildSite(wanted: Partial<Pick<Site, 'name' | 'timeZone'>> = {}): Promise<Site> {
  const { name = `Site ${randomUUID().slice(0, 8)}`, timeZone = 'Europe/London' } = wanted
  return (await Site.create({ name, timeZone, address: `1 Quay Road, ${name}` })).get({ plain: true })
}
