import type { Agent } from './app.ts'

/** The browser's `fetch` on a page under test: reaches the real app through an agent, which keeps the cookies. */
export function browserFetch(agent: Agent): typeof fetch {
  return async (input, init = {}) => {
    const address = input instanceof Request ? input.url : String(input)
    const method = (init.method ?? 'GET').toUpperCase()
    const asked = method === 'GET' ? agent.get(address) : method === 'POST' ? agent.post(address) : method === 'PUT' ? agent.put(address) : agent.delete(address)
    const answer = typeof init.body === 'string' ? await asked.type('json').send(init.body) : await asked
    return new Response(answer.text, { status: answer.status, headers: { 'content-type': String(answer.headers['content-type']) } })
  }
}
