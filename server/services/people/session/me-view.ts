import type { Me } from '../../../../shared/api/sessions.ts'
import { Customer } from '../../../models/people/customer.ts'
import { Person } from '../../../models/people/person.ts'
import { Site } from '../../../models/sites/site.ts'

/** The signed-in person as the browser needs them; null when they are gone. */
export async function meView(personId: string): Promise<Me | null> {
  const person = await Person.findOne({ where: { id: personId, state: 'active' }, raw: true })
  if (!person) return null
  const { id, name, email, role, customerId, siteId } = person
  const customer = customerId ? await Customer.findByPk(customerId, { raw: true }) : null
  const sites = await Site.findAll({ order: ['id'], raw: true })
  const own = sites.find((site) => site.id === siteId)
  return {
    id, name, initials: initialsOf(name), email, role, customerId, customerName: customer?.name ?? null,
    siteIds: customer ? [] : own ? [own.id] : sites.map((site) => site.id),
    place: customer?.name ?? own?.name ?? 'All sites',
    // Who has no site reads times as the first site does.
    timeZone: (own ?? sites[0])?.timeZone ?? 'UTC',
  }
}

/** First letters of the first and last word: "Ada M. Brandt" is AB. */
function initialsOf(name: string): string {
  const words = name.split(/\s+/).filter(Boolean)
  const letters = [words[0], words.length > 1 ? words.at(-1) : undefined].map((word) => (word ? [...word][0] : ''))
  return letters.join('').toUpperCase()
}
