import type { Server } from 'node:http'
import type { AddressInfo } from 'node:net'
import request from 'supertest'
import { afterAll } from 'vitest'
import { createApp } from '../../server/app.ts'
import { createIntegrations } from '../../server/integrations/create-integrations.ts'
import { closeLimits, limitsReady } from '../../server/integrations/limits/limits.ts'
import { setOutside } from '../../server/integrations/outside.ts'
import { readSettings } from '../../server/integrations/settings.ts'
import { testPassword } from './build/people.ts'

export type Agent = ReturnType<typeof request.agent>

export type TestApp = {
  address: string
  /** A browser where nobody is signed in; keeps its cookies. */
  agent(): Agent
  /** A browser where this person is signed in. */
  agentFor(person: { email: string }, options?: { sharedScreen?: boolean }): Promise<Agent>
}

/**
 * The whole app on a free port, with real integrations at the addresses of `settings` (fakes, or nobody). Call it at the
 * top of a test file: `const app = await startTestApp()`. It ends with the file.
 */
export async function startTestApp(settings: Record<string, string> = {}): Promise<TestApp> {
  const read = readSettings({ ...process.env, ...settings })
  const integrations = createIntegrations(read)
  setOutside({ ...integrations, settings: read })
  const app = createApp()
  await limitsReady()
  const server = await new Promise<Server>((resolve) => { const opening = app.listen(0, '127.0.0.1', () => resolve(opening)) })
  const address = `http://127.0.0.1:${(server.address() as AddressInfo).port}`
  afterAll(async () => {
    app.endStreams()
    server.closeAllConnections()
    await new Promise((resolve) => server.close(resolve))
    await app.close()
    closeLimits()
    integrations.mail.close()
  })

  const agent = () => request.agent(address).set('Sec-Fetch-Site', 'same-origin')
  return {
    address,
    agent,
    async agentFor(person, { sharedScreen = false } = {}) {
      const signedIn = agent()
      await signedIn.post('/api/session').send({ email: person.email, password: testPassword, sharedScreen }).expect(200)
      return signedIn
    },
  }
}
