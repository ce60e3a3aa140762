import { request as httpRequest } from 'node:http'
import { describe, expect, it } from 'vitest'
import { startTestApp } from '../support/app.ts'
import { buildHouse } from '../support/build/house.ts'
import { testPassword } from '../support/build/people.ts'
import { eventsOf } from '../support/events.ts'

const app = await startTestApp({ BASE_URL: 'http://lab.example' })

/** A request as a program would make it, with these headers only and as many bytes. */
function bare(method: string, path: string, headers: Record<string, string>, bytes = 0): Promise<number> {
  return new Promise((resolve, reject) => {
    httpRequest(`${app.address}${path}`, { method, headers }, (answer) => { answer.resume(); resolve(answer.statusCode ?? 0) }).on('error', reject).end(Buffer.alloc(bytes, ' '))
  })
}

let last = 0
function elsewhere() {
  last += 1
  return app.agent().set('X-Forwarded-For', `198.51.100.${last}`)
}

describe('where a change comes from', () => {
  it('is the product\'s own pages, by Sec-Fetch-Site or by Origin', async () => {
    const host = new URL(app.address).host
    const signOut = (headers: Record<string, string>) => bare('DELETE', '/api/session', headers)
    for (const site of ['same-origin', 'none']) expect(await signOut({ 'Sec-Fetch-Site': site })).toBe(200)
    expect(await signOut({ Origin: 'http://lab.example' })).toBe(200)
    expect(await signOut({ Origin: `http://${host}` })).toBe(200)

    for (const site of ['cross-site', 'same-site']) expect(await signOut({ 'Sec-Fetch-Site': site })).toBe(403)
    expect(await signOut({ 'Sec-Fetch-Site': 'cross-site', Origin: 'http://lab.example' })).toBe(403)
    for (const Origin of ['http://elsewhere.example', 'http://lab.example.elsewhere.example', 'https://lab.example', 'null']) expect(await signOut({ Origin })).toBe(403)
    expect(await signOut({})).toBe(403)
  })

  it('does not matter for reading, and a refused change leaves the session alone', async () => {
    const { client } = await buildHouse()
    expect(await bare('GET', '/api/session', { 'Sec-Fetch-Site': 'cross-site' })).toBe(200)
    const agent = await app.agentFor(client)
    await agent.delete('/api/session').set('Sec-Fetch-Site', 'cross-site').expect(403)
    await agent.get('/api/customers').expect(200)
  })
})

describe('every answer', () => {
  it('tells browsers what they may do', async () => {
    const { headers } = await app.agent().get('/api/session').expect(200)
    expect(headers['content-security-policy']).toBe(
      "default-src 'self';script-src 'self';style-src 'self';img-src 'self' data: blob:;font-src 'self';connect-src 'self';worker-src 'self';frame-ancestors 'none';form-action 'self';object-src 'none';base-uri 'none'")
    expect(headers).toMatchObject({ 'x-content-type-options': 'nosniff', 'referrer-policy': 'same-origin', 'x-frame-options': 'DENY', 'cache-control': 'no-store' })
    expect(headers['permissions-policy']).toContain('geolocation=()')
    expect(headers).not.toHaveProperty('x-powered-by')
    expect(headers).not.toHaveProperty('strict-transport-security')
    expect(headers['x-request-id']).toMatch(/^[0-9a-f-]{36}$/)
  })

  it('of a refusal is problem+json, for addresses that do not exist too', async () => {
    for (const path of ['/api/nowhere', '/api/links/%E0%A4%A']) {
      const { body, headers } = await app.agent().get(path).expect(404)
      expect(headers['content-type']).toContain('application/problem+json')
      expect(body.code).toBe('not-found')
    }
  })
})

describe('bodies', () => {
  it('of more than 1 MB are refused, of 30 MB only where curves come and from who is signed in', async () => {
    const { technician } = await buildHouse()
    const agent = app.agent()
    const signedIn = await agent.post('/api/session').send({ email: technician.email, password: testPassword }).expect(200)
    const Cookie = String(signedIn.headers['set-cookie']).split(';')[0] ?? ''
    const send = (method: string, path: string, megabytes: number, headers: Record<string, string>) =>
      bare(method, path, { 'Sec-Fetch-Site': 'same-origin', 'Content-Type': 'application/json', ...headers }, Math.round(megabytes * 1024 * 1024))
    const readings = `/api/test-runs/${technician.id}/readings`
    expect(await send('POST', '/api/people', 1.1, { Cookie })).toBe(413)
    expect(await send('POST', '/api/evaluate', 1.1, {})).toBe(413)
    expect(await send('PUT', readings, 1.1, {})).toBe(413)
    expect(await send('PUT', readings, 30.1, { Cookie })).toBe(413)
    expect(await send('PUT', readings, 1.1, { Cookie })).toBe(422)
  })
})

describe('the health page', () => {
  it('answers when the database does', async () => {
    const { text, headers } = await app.agent().get('/healthz').expect(200)
    expect(text).toBe('well')
    expect(headers['cache-control']).toBe('no-store')
  })
})

describe('guessing a password', () => {
  it('has to wait after a few tries on one account, from wherever, and the wait ends by itself', async () => {
    const { client } = await buildHouse()
    const statuses: number[] = []
    let wait = 0
    for (let n = 0; n < 12 && wait === 0; n += 1) {
      const answer = await elsewhere().post('/api/session').send({ email: client.email, password: 'a wrong guess' })
      statuses.push(answer.status)
      if (answer.status === 429) wait = Number(answer.headers['retry-after'])
    }
    expect(statuses.slice(0, 6)).toEqual([401, 401, 401, 401, 401, 401])
    expect(statuses.at(-1)).toBe(429)
    expect(wait).toBeGreaterThanOrEqual(1)
    expect(wait).toBeLessThanOrEqual(32)
    const { body } = await elsewhere().post('/api/session').send({ email: client.email.toUpperCase(), password: testPassword })
    expect(body).toMatchObject({ code: 'too-many' })
    expect((await eventsOf(client.id)).every((event) => event.type === 'person.sign-in-refused')).toBe(true)

    const { client: other } = await buildHouse()
    await elsewhere().post('/api/session').send({ email: other.email, password: testPassword }).expect(200)
  })

  it('waits just the same on an account that does not exist', async () => {
    const statuses = await Promise.all(Array.from({ length: 20 }, () => elsewhere().post('/api/session').send({ email: 'nobody@nowhere.example', password: 'a wrong guess' }).then((answer) => answer.status)))
    expect(statuses.filter((status) => status === 401).length).toBeLessThan(10)
    expect(statuses.filter((status) => status === 429).length).toBeGreaterThan(10)
  })

  it('has to wait after many tries from one address, on whatever accounts', async () => {
    const guesser = elsewhere()
    const statuses: number[] = []
    for (let n = 0; n < 28 && statuses.at(-1) !== 429; n += 1) statuses.push((await guesser.post('/api/session').send({ email: `person${n}@nowhere.example`, password: 'a wrong guess' })).status)
    expect(statuses.length).toBeGreaterThan(20)
    expect(statuses.at(-1)).toBe(429)
    const { client } = await buildHouse()
    await elsewhere().post('/api/session').send({ email: client.email, password: testPassword }).expect(200)
  })

  it('costs nothing who knows it', async () => {
    const { client } = await buildHouse()
    const agent = elsewhere()
    for (let round = 0; round < 3; round += 1) {
      for (let n = 0; n < 4; n += 1) await agent.post('/api/session').send({ email: client.email, password: 'a slip of the hand' }).expect(401)
      await agent.post('/api/session').send({ email: client.email, password: testPassword }).expect(200)
    }
  })
})
