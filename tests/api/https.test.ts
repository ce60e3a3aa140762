import { expect, it } from 'vitest'
import { startTestApp } from '../support/app.ts'
import { buildHouse } from '../support/build/house.ts'
import { testPassword } from '../support/build/people.ts'

const app = await startTestApp({ BASE_URL: 'https://lab.example' })

it('on https the cookie is tied to the host, and browsers are told to come by https only', async () => {
  const { client } = await buildHouse()
  const answer = await app.agent().post('/api/session').set('X-Forwarded-Proto', 'https').send({ email: client.email, password: testPassword }).expect(200)
  expect(String(answer.headers['set-cookie'])).toMatch(/^__Host-crosshead=.+; Path=\/; HttpOnly; Secure; SameSite=Lax$/)
  expect(answer.headers['strict-transport-security']).toBe('max-age=31536000')
})

it('gives no session away over plain http', async () => {
  const { client } = await buildHouse()
  const answer = await app.agent().post('/api/session').send({ email: client.email, password: testPassword })
  expect(answer.headers['set-cookie']).toBeUndefined()
})
