import { abilityFor, type Who } from '../../../shared/access/abilities.ts'
import type { Action, SubjectName } from '../../../shared/api/permission.ts'

type Place = { to: string; label: string; can: readonly [Action, SubjectName] }

/** Every page of the strip in its order, with what a person must be allowed to do to need it. */
const places: readonly Place[] = [
  { to: '/floor', label: 'Floor', can: ['manage', 'PlanEntry'] },
  { to: '/bench', label: 'Bench', can: ['record', 'TestRun'] },
  { to: '/receive', label: 'Receive', can: ['prepare', 'Step'] },
  { to: '/review', label: 'Review', can: ['review', 'TestRun'] },
  { to: '/jobs', label: 'Jobs', can: ['read', 'Job'] },
  { to: '/samples', label: 'Samples', can: ['read', 'Sample'] },
  { to: '/reports', label: 'Reports', can: ['read', 'Report'] },
  { to: '/invoices', label: 'Invoices', can: ['pay', 'Job'] },
  { to: '/equipment', label: 'Equipment', can: ['read', 'Equipment'] },
  { to: '/people', label: 'People', can: ['manage', 'Person'] },
]

/** The pages that a person needs; the first is where they begin. */
export function pagesFor(who: Who): readonly Place[] {
  const ability = abilityFor(who)
  return places.filter(({ can }) => ability.can(...can))
}
