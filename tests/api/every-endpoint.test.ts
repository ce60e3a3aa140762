import { beforeAll, describe, expect, it } from 'vitest'
import * as z from 'zod'
import { abilityFor } from '../../shared/access/abilities.ts'
import type { Endpoint } from '../../shared/api/endpoint.ts'
import { Role } from '../../shared/api/words.ts'
import { endpoints } from '../../shared/endpoints.ts'
import { methods } from '../../shared/methods.ts'
import { startTestApp, type Agent } from '../support/app.ts'
import { buildHouse } from '../support/build/house.ts'
import { buildOffers } from '../support/build/jobs.ts'
import { callerFor } from '../support/caller.ts'
import { exampleOf } from '../support/example.ts'

const app = await startTestApp()
const named = endpoints.map((e): [string, Endpoint] => [`${e.method} ${e.path}`, e])
/** A stream never ends by itself; `changes.test.ts` looks at it. What ends or changes the asker's own session comes with a browser of its own. */
const plain = named.filter(([, { answers }]) => answers !== 'stream')
const people = new Map<Role, { agent: Agent; allows: (e: Endpoint) => boolean }>()

beforeAll(async () => {
  const house = await buildHouse()
  await buildOffers(house.site.id)
  for (const role of Role.options) {
    const person = { client: house.client, technician: house.technician, manager: house.manager }[role]
    const { ability } = await callerFor(person)
    expect(abilityFor({ ...person, role, siteIds: [] }).rules.length).toBeGreaterThan(0)
    people.set(role, { agent: await app.agentFor(person), allows: (e) => typeof e.can === 'string' || ability.can(e.can[0], e.can[1]) })
  }
})

/** The address with an id that fits every parameter and belongs to nothing. */
function addressOf({ path, params, query }: Endpoint, more: Record<string, string> = {}): string {
  const fits: unknown = exampleOf(params)
  const values = Object(fits) as Record<string, unknown>
  const needed = new URLSearchParams({ ...Object.fromEntries(Object.entries(Object(exampleOf(query)) as Record<string, unknown>).map(([key, value]) => [key, String(value)])), ...more })
  return `/api${path.replace(/:(\w+)/g, (_, name: string) => String(values[name]))}${needed.size > 0 ? `?${needed}` : ''}`
}
const takesBody = ({ method, takes }: Endpoint) => takes === 'json' && method !== 'get'
/** The plainest body that is acceptable; a method is one that we have. */
const bodyOf = ({ body }: Endpoint): object => {
  const plainest = Object(exampleOf(body)) as Record<string, unknown>
  return 'methodId' in plainest ? { ...plainest, methodId: methods[0]!.id } : plainest
}
const isOpen = ({ body }: Endpoint) => body.safeParse({ surprise: 1 }).success

describe('without a session', () => {
  it.each(plain)('%s', async (_name, e) => {
    const answer = await app.agent()[e.method](addressOf(e)).send(takesBody(e) ? bodyOf(e) : undefined)
    if (e.can === 'anyone') {
      expect(answer.status).toBeLessThan(500)
      expect(answer.body.detail).not.toBe('there is no such address')
    } else {
      expect([answer.status, answer.body.code]).toEqual([401, 'not-signed-in'])
      expect(answer.headers['content-type']).toMatch(/^application\/problem\+json/)
    }
  })
})

describe.each(Role.options)('a %s', (role) => {
  it.each(plain)('%s', async (_name, e) => {
    if (e.can === 'anyone') return
    const { agent, allows } = people.get(role)!
    // nothing that is sent here is acceptable, so that what is allowed gets as far as the check of its input and no further
    const answer = await agent[e.method](addressOf(e, { surprise: '1' })).send(takesBody(e) ? { surprise: 1 } : undefined)
    if (allows(e)) expect([answer.status, answer.body.code]).toEqual([422, 'not-acceptable'])
    else expect([answer.status, answer.body.code]).toEqual([403, 'not-allowed'])
  })
})

describe('an unknown key in the body', () => {
  it.each(plain.filter(([, e]) => takesBody(e) && e.can !== 'anyone' && !isOpen(e)))('%s', async (_name, e) => {
    for (const { agent, allows } of people.values()) {
      if (!allows(e)) continue
      const { body, status } = await agent[e.method](addressOf(e)).send({ ...bodyOf(e), surprise: 1 })
      expect(status).toBe(422)
      expect(Object.values(body.fields).join()).toContain('surprise')
    }
  })
  it('is refused by every endpoint but the engine, whose cases are of any shape', () => {
    expect(plain.filter(([, e]) => isOpen(e)).map(([name]) => name)).toEqual(['post /evaluate'])
  })
})

describe('an id that belongs to nothing', () => {
  it.each(plain.filter(([, e]) => e.can !== 'anyone' && e.path.includes(':')))('%s', async (_name, e) => {
    for (const { agent, allows } of people.values()) {
      if (!allows(e)) continue
      const request = agent[e.method](addressOf(e))
      const answer = e.takes === 'file' ? await request.attach('file', Buffer.from('a,b\n'), 'a.csv') : await request.send(takesBody(e) ? bodyOf(e) : undefined)
      expect([answer.status, answer.body.code]).toEqual([404, 'not-found'])
      expect(answer.body.detail).not.toBe('there is no such address')
      expect(answer.body.requestId).toEqual(expect.any(String))
    }
  })
  it.each(plain.filter(([, e]) => e.can !== 'anyone' && e.path.includes('Id')))('%s when it is no id at all', async (_name, e) => {
    for (const { agent, allows } of people.values()) {
      if (!allows(e)) continue
      const bad = addressOf(e).replace(/[0-9a-f]{8}-[0-9a-f-]{27}/, 'not-an-id')
      expect((await agent[e.method](bad).send(takesBody(e) ? bodyOf(e) : undefined)).status).toBe(422)
    }
  })
})

describe('an acceptable request about nothing we have', () => {
  it.each(plain.filter(([, e]) => e.can !== 'anyone'))('%s', async (_name, e) => {
    for (const { agent, allows } of people.values()) {
      if (!allows(e)) continue
      const request = agent[e.method](addressOf(e))
      const answer = e.takes === 'file' ? await request.attach('file', Buffer.from('a,b\n'), 'a.csv') : await request.send(takesBody(e) ? bodyOf(e) : undefined)
      expect(answer.status, JSON.stringify(answer.body)).toBeLessThan(500)
      if (answer.status === 200 && e.answers === 'json') expect(e.response.safeParse(answer.body).success).toBe(true)
    }
  })
})

describe('a list', () => {
  const lists = plain.filter(([, e]) => e.method === 'get' && e.query instanceof z.ZodObject && 'after' in e.query.shape)
  it.each(lists)('%s takes no mark, limit or text that could upset the database', async (_name, e) => {
    expect(lists.length).toBeGreaterThan(4)
    for (const { agent, allows } of people.values()) {
      if (!allows(e)) continue
      for (const more of [{ after: 'x' }, { after: '1.5' }, { after: 'Infinity' }, { after: "'; drop table jobs; --" }, { limit: '0' }, { limit: '1e9' }, { limit: '-1' }] as Record<string, string>[]) {
        expect([404, 422], JSON.stringify(more)).toContain((await agent.get(addressOf(e, more))).status)
      }
      for (const search of ['%', '_', '\\', "'", '"', '$1', ':x', '?']) if ('search' in (e.query as z.ZodObject).shape) expect((await agent.get(addressOf(e, { search }))).status).toBe(200)
    }
  })
})

it('no two endpoints are the same', () => {
  const shapes = endpoints.map(({ method, path }) => `${method} ${path.replace(/:\w+/g, ':')}`)
  expect(shapes).toEqual([...new Set(shapes)])
})
