import { placeOf } from '../../../shared/access/place-of.ts'
import type { Person } from '../../../shared/api/people.ts'

/** Where a person belongs, in words. */
export function placeWords({ role, siteName, customerName }: Pick<Person, 'role' | 'siteName' | 'customerName'>): string {
  return customerName ?? siteName ?? (placeOf(role) === 'site or all' ? 'All sites' : 'no place')
}
