import http from 'node:http'
import type { Change } from '../../shared/api/changes.ts'
import type { Agent, TestApp } from './app.ts'

export type Stream = {
  /** Everything that came so far. */
  text(): string
  /** The numbered events so far, in the order they came. */
  events(): { id: number; event: string; data: string }[]
  /** All changes told so far. */
  changes(): Change[]
  /** Comes back when what came holds true; fails after five seconds. */
  until(holds: (text: string) => boolean): Promise<void>
  /** When the server ended it. */
  ended: Promise<void>
  close(): void
}

/** What an agent's browser would send. */
export function cookieOf(agent: Agent): string {
  return agent.jar.getCookies({ domain: '127.0.0.1', path: '/api', secure: false, script: false }).toValueString()
}

/** Opens the stream of changes as the browser of an agent does. */
export async function openStream(app: TestApp, agent: Agent, headers: Record<string, string> = {}): Promise<Stream> {
  const cookie = cookieOf(agent)
  let text = ''
  let wake = () => {}
  const response = await new Promise<http.IncomingMessage>((resolve, reject) => {
    http.get(`${app.address}/api/changes`, { headers: { cookie, accept: 'text/event-stream', 'sec-fetch-site': 'same-origin', ...headers } }, resolve).on('error', reject)
  })
  if (response.statusCode !== 200) throw new Error(`the stream was refused: ${response.statusCode}`)
  response.setEncoding('utf8').on('data', (part: string) => { text += part; wake() })
  const ended = new Promise<void>((resolve) => response.on('close', () => { resolve(); wake() }).on('error', () => resolve()))
  const events = () => text.split('\n\n').flatMap((block) => {
    const line = (name: string) => block.split('\n').find((each) => each.startsWith(`${name}: `))?.slice(name.length + 2)
    const id = line('id')
    return id === undefined ? [] : [{ id: Number(id), event: line('event') ?? '', data: line('data') ?? '' }]
  })
  const stream: Stream = {
    text: () => text, events, ended,
    changes: () => events().filter(({ event }) => event === 'changes').flatMap(({ data }) => JSON.parse(data) as Change[]),
    async until(holds) {
      const end = Date.now() + 5000
      while (!holds(text)) {
        if (Date.now() > end) throw new Error(`the stream said only: ${text}`)
        await new Promise<void>((resolve) => { wake = resolve; setTimeout(resolve, 200) })
      }
    },
    close: () => response.destroy(),
  }
  await stream.until((all) => all.includes('event: hello'))
  return stream
}
