import type { Role } from '../api/words.ts'

/** Where a person of a role belongs: an organisation among the customers, one site, or one site or all of them. */
export type PlaceOfRole = 'customer' | 'site' | 'site or all'

const places: Record<Role, PlaceOfRole> = { client: 'customer', technician: 'site', manager: 'site or all' }

export const placeOf = (role: Role): PlaceOfRole => places[role]
