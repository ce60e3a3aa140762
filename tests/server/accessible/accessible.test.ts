import { subject } from '@casl/ability'
import { QueryTypes } from 'sequelize'
import { beforeAll, describe, expect, it } from 'vitest'
import { v7 } from 'uuid'
import { database } from '../../../server/database/connection.ts'
import { accessibleWhere } from '../../../server/models/accessible.ts'
import { tableFor, type Kept } from './rule-tables.ts'
import { abilityFor, type Who } from '../../../shared/access/abilities.ts'
import { actions, subjectNames, type SubjectFields, type SubjectName } from '../../../shared/api/permission.ts'
import { Role } from '../../../shared/api/words.ts'
import { asSuperuser } from '../../support/superuser.ts'

/*
 * Every rule is asked twice: the object by `ability.can`, and a table of rows by its SQL. Rows hold every mixture of the
 * values that rules look at: own, of others, and empty.
 */
const [own, other, me, someone] = [v7(), v7(), v7(), v7()]
const Rows = tableFor('RuleRow', 'rule_rows')
const people: Record<string, Who> = {
  'a client': { id: me, role: 'client', customerId: own, siteIds: [] },
  'a client without a customer': { id: me, role: 'client', customerId: null, siteIds: [] },
  'a technician': { id: me, role: 'technician', customerId: null, siteIds: [own] },
  'a manager of two sites': { id: me, role: 'manager', customerId: null, siteIds: [own, me] },
  'a manager of no site': { id: me, role: 'manager', customerId: null, siteIds: [] },
}
let rows: Kept[] = []

beforeAll(async () => {
  await asSuperuser(async (client) => {
    await client.query('create table rule_rows (id uuid primary key, customer_id uuid, site_id uuid, performed_by_id uuid not null, person_id uuid, visible_to_customer boolean not null, role text not null, state text not null, created_at timestamptz)')
    await client.query('grant select, insert on rule_rows to crosshead_app')
  })
  const mixed = [own, other, null].flatMap((customerId) => [own, other, null].flatMap((siteId) => [me, someone].flatMap((performedById) =>
    [me, someone, null].flatMap((personId) => [true, false].flatMap((visibleToCustomer) => ['client', 'manager'].flatMap((role) => ['draft', 'placed'].map((state) =>
      ({ customerId, siteId, performedById, personId, visibleToCustomer, role, state }))))))))
  const ids = [me, own, ...mixed.slice(2).map(() => v7())]
  await Rows.bulkCreate(mixed.map((row, at) => ({ ...row, id: ids[at]! })))
  rows = await Rows.findAll({ raw: true })
})

/** A row as rules see a loaded record: what is empty in the database is no field of it. */
const seen = (row: Kept): SubjectFields => Object.fromEntries(Object.entries(row).filter(([key, value]) => key !== 'createdAt' && value !== null))

describe.each(Object.entries(people))('%s', (_name, who) => {
  const ability = abilityFor(who)
  it.each(subjectNames)('may do to the rows of %s by SQL exactly what they may by object', async (name: SubjectName) => {
    for (const action of actions) {
      const where = accessibleWhere(ability, action, name)
      const bySql = where ? (await Rows.findAll({ where, attributes: ['id'], raw: true })).map(({ id }) => id).sort() : []
      const byObject = rows.filter((row) => ability.can(action, subject(name, seen(row)) as never)).map(({ id }) => id).sort()
      expect(bySql, `${action} ${name}`).toEqual(byObject)
      if (where === null) expect(ability.can(action, name), `${action} ${name}`).toBe(false)
    }
  })
})

it('is a test of every role, on rows where each rule says yes to some and no to others', () => {
  expect(new Set(Object.values(people).map(({ role }) => role))).toEqual(new Set(Role.options))
  const technician = abilityFor(people['a technician']!)
  const may = rows.map((row) => technician.can('review', subject('TestRun', seen(row)) as never))
  expect(new Set(may)).toEqual(new Set([true, false]))
  expect(rows.length).toBeGreaterThan(400)
})

describe('columns of a rule that forbids', () => {
  it('cannot be empty in their tables, where SQL and object would part', async () => {
    const forbidding = Object.entries(people).flatMap(([, who]) => abilityFor(who).rules).filter(({ inverted }) => inverted)
    expect(forbidding.length).toBeGreaterThan(0)
    const tables: Partial<Record<SubjectName, string>> = { TestRun: 'test_runs' }
    for (const { subject: name, conditions } of forbidding) {
      const tableName = tables[String(name) as SubjectName]
      expect(tableName, `name the table of ${String(name)} here`).toBeDefined()
      for (const column of Object.keys(conditions ?? {})) {
        const snake = column.replace(/[A-Z]/g, (letter) => `_${letter.toLowerCase()}`)
        const [found] = await database.query<{ nullable: string }>('select is_nullable as nullable from information_schema.columns where table_name = $1 and column_name = $2', { bind: [tableName, snake], type: QueryTypes.SELECT })
        expect(found, `${tableName}.${snake}`).toEqual({ nullable: 'NO' })
      }
    }
  })
})

it('refuses an operator it has no SQL for, rather than leaving it out', async () => {
  const { createMongoAbility } = await import('@casl/ability')
  const ability = createMongoAbility([{ action: 'read', subject: 'Job', conditions: { siteId: { $regex: 'x' } } }])
  expect(() => accessibleWhere(ability as never, 'read', 'Job')).toThrow(/no SQL for the rule operator \$regex/)
})
