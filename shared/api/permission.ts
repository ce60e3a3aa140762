/** What people may do, and to what. Plain words, so that every layer may name them. */
export const actions = ['read', 'create', 'change', 'cancel', 'pay', 'receive', 'prepare', 'record', 'review', 'answer', 'issue', 'manage'] as const
export type Action = (typeof actions)[number]

export const subjectNames = [
  'Authorisation', 'Bench', 'Customer', 'Equipment', 'Event', 'File', 'Hold', 'Invoice', 'Job', 'Message', 'MethodOffer',
  'Person', 'PlanEntry', 'Report', 'Sample', 'Site', 'Step', 'Test', 'TestRun',
] as const
export type SubjectName = (typeof subjectNames)[number]

/** The plain fields that rules look at. A record has those that apply to it. */
export type SubjectFields = { id?: string; customerId?: string; siteId?: string; personId?: string; performedById?: string; role?: string; visibleToCustomer?: boolean; state?: string }
