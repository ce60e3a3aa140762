import type { AppAbility } from '../shared/access/abilities.ts'
import type { Role } from '../shared/api/words.ts'

/** Who is asking, and what they may do. The worker asks as nobody: it has no person and no ability. */
export type Caller = {
  person: { id: string; name: string; email: string; role: Role; customerId: string | null; siteIds: readonly string[] }
  ability: AppAbility
  requestId: string
}
