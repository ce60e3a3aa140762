import { AbilityBuilder, createMongoAbility, type ForcedSubject, type MongoAbility } from '@casl/ability'
import type { Action, SubjectFields, SubjectName } from '../api/permission.ts'
import type { Role } from '../api/words.ts'

type Rec = { [N in SubjectName]: SubjectFields & ForcedSubject<N> }[SubjectName]
export type AppAbility = MongoAbility<[Action, SubjectName | Rec]>

/** What rules need to know of a person. A client has a customer, the others have sites. */
export type Who = { id: string; role: Role; customerId: string | null; siteIds: readonly string[] }

type Grant = (builder: Pick<AbilityBuilder<AppAbility>, 'can' | 'cannot'>, who: Who) => void

/** A draft is the customer's own paper until it is placed. */
const ordered = { state: { $ne: 'draft' } }

const roles: Record<Role, Grant> = {
  client({ can }, { id, customerId }) {
    if (!customerId) return
    const own = { customerId }
    can('read', ['Job', 'Sample', 'Test', 'Hold', 'Message', 'Report', 'Invoice'], own)
    can('read', 'File', { ...own, visibleToCustomer: true })
    can('create', ['Job', 'File', 'Message'], own)
    can(['change', 'pay', 'cancel'], 'Job', own)
    can('answer', 'Hold', own)
    can('read', 'Customer', { id: customerId })
    can('read', 'Person', { id })
    can('read', ['MethodOffer', 'Site'])
  },
  technician({ can, cannot }, { id, siteIds }) {
    const here = { siteId: { $in: [...siteIds] } }
    can('read', ['Sample', 'Test', 'Step', 'PlanEntry', 'Hold', 'Message', 'File', 'TestRun', 'Bench', 'Equipment'], here)
    can('read', 'Job', { ...here, ...ordered })
    can('receive', ['Sample', 'Hold'], here)
    can('prepare', 'Step', here)
    can('record', 'TestRun', here)
    can('create', ['File', 'Message'], here)
    can('review', 'TestRun', here)
    cannot('review', 'TestRun', { performedById: id }).because('You ran this test. Someone else has to review it.')
    can('read', 'Person', { id })
    can('read', ['MethodOffer', 'Site'])
  },
  manager({ can, cannot }, { id, siteIds }) {
    const here = { siteId: { $in: [...siteIds] } }
    can('read', ['Sample', 'Test', 'Step', 'PlanEntry', 'Hold', 'Message', 'File', 'TestRun', 'Bench', 'Equipment', 'Report', 'Invoice', 'Event'], here)
    can('read', 'Job', { ...here, ...ordered })
    can('receive', ['Sample', 'Hold'], here)
    can('create', ['File', 'Message'], here)
    can('cancel', 'Job', { ...here, ...ordered })
    can('manage', 'PlanEntry', here)
    can('review', 'TestRun', here)
    cannot('review', 'TestRun', { performedById: id }).because('You ran this test. Someone else has to review it.')
    can('issue', 'Report', here)
    can(['read', 'manage'], ['Person', 'Authorisation'], here)
    can(['read', 'manage'], 'Person', { role: 'client' })
    can('read', ['Customer', 'MethodOffer', 'Site'])
  },
}

/** What a person may do: conditions on plain fields, the same for an endpoint, a loaded record, a list's SQL and a button. */
export function abilityFor(who: Who): AppAbility {
  const builder = new AbilityBuilder<AppAbility>(createMongoAbility)
  roles[who.role](builder, who)
  return builder.build()
}
