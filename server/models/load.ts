import { subject } from '@casl/ability'
import { Op, type Model, type ModelStatic, type Transaction, type WhereOptions } from 'sequelize'
import type { AppAbility } from '../../shared/access/abilities.ts'
import type { Action, SubjectFields, SubjectName } from '../../shared/api/permission.ts'
import { Problem } from '../../shared/problems.ts'
import { accessibleWhere } from './accessible.ts'

type Asker = { ability: AppAbility }
type Table<R extends object> = ModelStatic<Model<R, never>>
/** TestRun as people read it: test run. */
const wordsOf = (name: SubjectName) => name.replace(/(?<=[a-z])[A-Z]/g, ' $&').toLowerCase()
const rowOf = <R extends object>(table: ModelStatic<Model>): Table<R> => table as unknown as Table<R>

/** The row with this id, if the caller may read it; otherwise `not-found`, as if it were not there. Locks it inside a transaction when asked. */
export async function loadOne<T extends ModelStatic<Model>>(
  table: T, name: SubjectName, id: string, caller: Asker, { tx, lock = false }: { tx?: Transaction; lock?: boolean } = {},
): Promise<T extends ModelStatic<Model<infer R, object>> ? R : never> {
  const allowed = accessibleWhere(caller.ability, 'read', name)
  const row = allowed && (await rowOf<Record<string, unknown>>(table).findOne({ where: { [Op.and]: [{ id }, allowed] } as WhereOptions, raw: true, transaction: tx, lock: lock && tx ? tx.LOCK.UPDATE : undefined }))
  if (!row) throw new Problem('not-found', `there is no such ${wordsOf(name)}`)
  return row as never
}

/** Refuses, with the rule's own reason, what the caller sees but may not do. */
export function must(caller: Asker, action: Action, name: SubjectName, row: SubjectFields): void {
  const record = subject(name, { ...row }) as never
  if (caller.ability.can(action, record)) return
  throw new Problem('not-allowed', caller.ability.relevantRuleFor(action, record)?.reason ?? `you may not ${action} this ${wordsOf(name)}`)
}

/** Refuses a change that was made on an older version than the record's. */
export function mustBeCurrent(row: { version: number }, seen: number, what: string): void {
  if (row.version !== seen) throw new Problem('already-changed', `${what} has changed since you opened it; look at it again`, { version: `now ${row.version}, you saw ${seen}` })
}
