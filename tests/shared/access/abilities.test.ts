import { subject } from '@casl/ability'
import { describe, expect, it } from 'vitest'
import { abilityFor, type Who } from '../../../shared/access/abilities.ts'
import { placeOf } from '../../../shared/access/place-of.ts'
import { benchRole } from '../../../shared/access/bench-role.ts'
import type { Action, SubjectFields, SubjectName } from '../../../shared/api/permission.ts'
import { Role } from '../../../shared/api/words.ts'

const client: Who = { id: 'me', role: 'client', customerId: 'forge', siteIds: [] }
const technician: Who = { id: 'me', role: 'technician', customerId: null, siteIds: ['here'] }
const manager: Who = { id: 'me', role: 'manager', customerId: null, siteIds: ['here'] }
const may = (who: Who, action: Action, name: SubjectName, fields: SubjectFields) => abilityFor(who).can(action, subject(name, { ...fields }))

describe('a client', () => {
  it.each<SubjectName>(['Job', 'Sample', 'Test', 'Hold', 'Message', 'Report', 'Invoice'])('reads the %s of their customer and of no other, nor one of nobody', (name) => {
    expect(may(client, 'read', name, { customerId: 'forge' })).toBe(true)
    expect(may(client, 'read', name, { customerId: 'rival' })).toBe(false)
    expect(may(client, 'read', name, {})).toBe(false)
  })
  it('reads the files meant for the customer', () => {
    expect(may(client, 'read', 'File', { customerId: 'forge', visibleToCustomer: true })).toBe(true)
    expect(may(client, 'read', 'File', { customerId: 'forge', visibleToCustomer: false })).toBe(false)
    expect(may(client, 'read', 'File', { customerId: 'rival', visibleToCustomer: true })).toBe(false)
  })
  it.each<[Action, SubjectName]>([['read', 'TestRun'], ['read', 'Bench'], ['read', 'PlanEntry'], ['read', 'Event'], ['read', 'Equipment'], ['record', 'TestRun'], ['review', 'TestRun'], ['issue', 'Report'], ['receive', 'Sample'], ['manage', 'Person']])('may never %s a %s', (action, name) => {
    expect(abilityFor(client).can(action, name)).toBe(false)
  })
  it('who belongs to no customer may do nothing', () => {
    expect(abilityFor({ ...client, customerId: null }).rules).toEqual([])
  })
})

describe('a technician', () => {
  it('works with what is at their site', () => {
    for (const [action, name] of [['receive', 'Sample'], ['prepare', 'Step'], ['record', 'TestRun'], ['read', 'TestRun'], ['read', 'Bench']] as const) {
      expect(may(technician, action, name, { siteId: 'here', performedById: 'other' })).toBe(true)
      expect(may(technician, action, name, { siteId: 'there', performedById: 'other' })).toBe(false)
      expect(may(technician, action, name, {})).toBe(false)
    }
  })
  it.each<[Action, SubjectName]>([['issue', 'Report'], ['manage', 'Person'], ['manage', 'PlanEntry'], ['read', 'Invoice'], ['read', 'Customer'], ['read', 'Event'], ['cancel', 'Job'], ['pay', 'Job']])('may never %s a %s', (action, name) => {
    expect(abilityFor(technician).can(action, name)).toBe(false)
  })
})

describe.each([['a technician', technician], ['a manager', manager]])('%s as reviewer', (_name, who) => {
  it('reviews the runs of others and is told why not their own', () => {
    expect(may(who, 'review', 'TestRun', { siteId: 'here', performedById: 'other' })).toBe(true)
    expect(may(who, 'review', 'TestRun', { siteId: 'here' })).toBe(true)
    expect(may(who, 'review', 'TestRun', { siteId: 'there', performedById: 'other' })).toBe(false)
    const own = subject('TestRun', { siteId: 'here', performedById: 'me' }) as never
    expect(abilityFor(who).can('review', own)).toBe(false)
    expect(abilityFor(who).relevantRuleFor('review', own)?.reason).toBe('You ran this test. Someone else has to review it.')
  })
})

describe('a manager', () => {
  it('carries out nothing at a bench', () => {
    for (const [action, name] of [['record', 'TestRun'], ['prepare', 'Step']] as const) expect(abilityFor(manager).can(action, name)).toBe(false)
  })
  it('manages the people of their sites and clients, and nobody of another site', () => {
    expect(may(manager, 'manage', 'Person', { siteId: 'here', role: 'technician' })).toBe(true)
    expect(may(manager, 'manage', 'Person', { role: 'client' })).toBe(true)
    expect(may(manager, 'manage', 'Person', { siteId: 'there', role: 'technician' })).toBe(false)
    expect(may(manager, 'manage', 'Person', { role: 'manager' })).toBe(false)
  })
  it('sees a job once it is ordered', () => {
    for (const who of [technician, manager]) {
      expect(may(who, 'read', 'Job', { siteId: 'here', state: 'placed' })).toBe(true)
      expect(may(who, 'read', 'Job', { siteId: 'here', state: 'draft' })).toBe(false)
    }
    expect(may(manager, 'cancel', 'Job', { siteId: 'here', state: 'draft' })).toBe(false)
  })
})

it('every role has its place, and one of them works at benches', () => {
  expect(Object.fromEntries(Role.options.map((role) => [role, placeOf(role)]))).toEqual({ client: 'customer', technician: 'site', manager: 'site or all' })
  expect(abilityFor({ ...technician, role: benchRole }).can('record', 'TestRun')).toBe(true)
})
