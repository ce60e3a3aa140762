import type { Right } from '../../../shared/api/words.ts'
import type { CustomerKey, SiteKey } from './demo-keys.ts'

/** One password for all accounts of the demonstration; it refuses to be made in production unless asked for. */
export const demoPassword = 'straw gold bronze purple'

export const customers: readonly { key: CustomerKey; name: string; address: string; reportEmail: string }[] = [
  { key: 'brackwater', name: 'Brackwater Forge', address: 'Quay Works, Brackwater', reportEmail: 'quality@brackwater.example' },
  { key: 'lindmoor', name: 'Lindmoor Castings', address: 'Moor Lane 8, Lindmoor', reportEmail: 'reports@lindmoor.example' },
  { key: 'oriel', name: 'Oriel Gearworks', address: 'Oriel Park, Unit 3', reportEmail: 'inspection@oriel.example' },
]

type DemoPerson = { email: string; name: string; what: string } & ({ role: 'client'; customer: CustomerKey } | { role: 'technician'; site: SiteKey; rights: readonly Right[] } | { role: 'manager'; site: SiteKey | null; rights: readonly Right[] })

export const people: readonly DemoPerson[] = [
  { email: 'buyer@brackwater.example', name: 'Bryn Aldous', what: 'orders for Brackwater Forge', role: 'client', customer: 'brackwater' },
  { email: 'quality@lindmoor.example', name: 'Lena Moss', what: 'orders for Lindmoor Castings', role: 'client', customer: 'lindmoor' },
  { email: 'inspection@oriel.example', name: 'Oren Gale', what: 'orders for Oriel Gearworks', role: 'client', customer: 'oriel' },
  { email: 'bench@tarnwick.example', name: 'Edda Vane', what: 'technician at Tarnwick, all methods', role: 'technician', site: 'T', rights: ['carry out'] },
  { email: 'frame@tarnwick.example', name: 'Kit Orme', what: 'second technician at Tarnwick, may review', role: 'technician', site: 'T', rights: ['carry out', 'review'] },
  { email: 'bench@ollerby.example', name: 'Mara Ashe', what: 'technician at Ollerby', role: 'technician', site: 'O', rights: ['carry out'] },
  { email: 'bench@selwyn.example', name: 'Sol Petrie', what: 'technician at Port Selwyn', role: 'technician', site: 'P', rights: ['carry out'] },
  { email: 'manager@tarnwick.example', name: 'Ruth Arden', what: 'manager of all sites: reviews and signs', role: 'manager', site: null, rights: ['review', 'sign'] },
  { email: 'manager@ollerby.example', name: 'Owen Lacey', what: 'manager of Ollerby', role: 'manager', site: 'O', rights: ['review', 'sign'] },
]
