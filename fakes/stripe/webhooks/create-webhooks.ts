import type { EventRecord, StripeState } from '../stripe-state.ts'
import { newId } from '../new-id.ts'
import { found } from '../api/found.ts'
import { postNotice } from './post-notice.ts'
import { sign } from './sign.ts'

/** What happens to new events: sent at once, kept until released, thrown away, or sent twice. */
export const webhookModes = ['send', 'hold', 'drop', 'twice'] as const
export type WebhookMode = (typeof webhookModes)[number]

/** Forgeries a receiver has to refuse: another secret, a body changed after signing, a signature an hour old. */
export const forgeries = ['wrong-secret', 'changed-body', 'old'] as const
export type Forgery = (typeof forgeries)[number]

export type WebhooksOptions = {
  state: StripeState
  save: () => void
  url: string
  secret: string
  apiVersion: string
  /** Pauses before the second, third … attempt; after the last one the event is given up. */
  retryDelaysMs: number[]
}

export type Webhooks = ReturnType<typeof createWebhooks>

/** Sends events to the receiver: signed, retried with growing pauses, and as late, doubled or disordered as asked. */
export function createWebhooks({ state, save, url, secret, apiVersion, retryDelaysMs }: WebhooksOptions) {
  let receiver = url
  let mode: WebhookMode = 'send'
  let stopped = false
  const timers = new Map<string, NodeJS.Timeout>()
  const running = new Set<Promise<unknown>>()
  const abort = new AbortController()

  const post = (body: string, signature: string) => postNotice(receiver, body, signature, abort.signal)

  const attempt = async (event: EventRecord): Promise<string> => {
    const answer = await post(event.body, sign(event.body, secret))
    if (stopped) return answer.text
    event.delivery.attempts += 1
    event.delivery.lastAnswer = answer.text
    if (answer.accepted) {
      event.delivery.state = 'delivered'
      event.delivery.nextAttemptAt = null
    } else if (event.delivery.state !== 'delivered') {
      planRetry(event)
    }
    save()
    return answer.text
  }
  const planRetry = (event: EventRecord) => {
    const pause = retryDelaysMs[event.delivery.attempts - 1]
    event.delivery.state = pause === undefined ? 'given-up' : 'waiting'
    event.delivery.nextAttemptAt = pause === undefined ? null : Date.now() + pause
    if (pause !== undefined) schedule(event, pause)
  }
  const schedule = (event: EventRecord, pause: number) => {
    if (stopped) return
    clearTimeout(timers.get(event.id))
    timers.set(event.id, setTimeout(() => { timers.delete(event.id); start(attempt(event)) }, pause).unref())
  }
  const start = (work: Promise<unknown>) => {
    running.add(work)
    void work.finally(() => running.delete(work))
  }

  // What a stopped process had not delivered goes out now.
  for (const event of Object.values(state.events)) {
    if (event.delivery.state === 'waiting') schedule(event, Math.max(0, (event.delivery.nextAttemptAt ?? 0) - Date.now()))
  }

  return {
    announce: (type: string, object: { id: string }): void => {
      const event = newEvent(type, object, apiVersion)
      state.events[event.id] = event
      if (mode === 'hold') event.delivery.state = 'held'
      if (mode === 'drop') event.delivery.state = 'dropped'
      if (mode === 'send' || mode === 'twice') start(Promise.resolve().then(() => attempt(event)))
      if (mode === 'twice') start(Promise.resolve().then(() => attempt(event)))
    },

    /** Sends what was held, one after the other, newest first if reversed; resolves with the receiver's answers. */
    release: async ({ reversed = false, times = 1 } = {}): Promise<string[]> => {
      const held = Object.values(state.events).filter((event) => event.delivery.state === 'held')
      const answers: string[] = []
      for (const event of reversed ? held.reverse() : held) {
        for (let sent = 0; sent < times; sent += 1) answers.push(await attempt(event))
      }
      return answers
    },

    resend: (eventId: string): Promise<string> => attempt(found(state.events, eventId, 'event')),

    /** Sends a notice that was never recorded, with a fault in its signature; resolves with the receiver's answer. */
    forge: async (type: string, object: { id: string }, forgery: Forgery): Promise<string> => {
      const { body } = newEvent(type, object, apiVersion)
      const anHourAgo = Math.floor(Date.now() / 1000) - 3600
      if (forgery === 'wrong-secret') return (await post(body, sign(body, newId('whsec')))).text
      if (forgery === 'old') return (await post(body, sign(body, secret, anHourAgo))).text
      return (await post(body.replace(/^\{"id":"evt_/, '{"id":"evt_x'), sign(body, secret))).text
    },

    mode: () => mode,
    setMode: (next: WebhookMode): void => {
      mode = next
    },
    setReceiver: (next: string): void => {
      receiver = next
    },

    /** Resolves when no attempt is on its way; planned retries are not waited for. */
    settled: async (): Promise<void> => {
      while (running.size > 0) await Promise.allSettled([...running])
    },

    stop: async (): Promise<void> => {
      stopped = true
      timers.forEach((timer) => clearTimeout(timer))
      abort.abort()
      await Promise.allSettled([...running])
    },
  }
}

function newEvent(type: string, object: { id: string }, apiVersion: string): EventRecord {
  const id = newId('evt')
  const created = Math.floor(Date.now() / 1000)
  const body = JSON.stringify({
    id,
    object: 'event',
    api_version: apiVersion,
    created,
    data: { object },
    livemode: false,
    pending_webhooks: 1,
    request: { id: null, idempotency_key: null },
    type,
  })
  return { id, type, created, body, delivery: { state: 'waiting', attempts: 0, nextAttemptAt: null, lastAnswer: null } }
}
