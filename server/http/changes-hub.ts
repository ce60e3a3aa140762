import { subject } from '@casl/ability'
import type { Response } from 'express'
import { Redis } from 'ioredis'
import type { Change } from '../../shared/api/changes.ts'
import type { Caller } from '../caller.ts'
import { changesChannel } from '../integrations/changes-channel.ts'
import { lastLedgerId, readLedgerAfter, type Told } from '../services/ledger/read-ledger.ts'
import { log } from './log.ts'

/** `upTo` is the last number of the ledger that this stream has been told of. */
type Listener = { caller: Caller; res: Response; upTo: number }

/** A stream that falls further behind than this is told to fetch everything anew. */
const longest = 1000
/** Bytes that wait for a slow reader; beyond them the stream is cut, and the browser comes back for what it missed. */
const mostWaiting = 1_000_000
const endsStreams = new Set(['person.disabled', 'person.password-changed', 'person.signed-out'])

/**
 * Tells open screens what changed. The ledger is the truth: Redis only says that it is worth looking, and every two
 * seconds the hub looks anyway, so that a lost hint costs two seconds and no change.
 */
export class ChangesHub {
  private readonly listeners = new Set<Listener>()
  private readonly redis: Redis
  private seen = 0
  private looking: Promise<void> | null = null
  private again = false
  private readonly timer: NodeJS.Timeout

  constructor(redisUrl: string, prefix: string) {
    this.redis = new Redis(redisUrl, { maxRetriesPerRequest: null, retryStrategy: (times) => Math.min(times * 100, 2000) })
    this.redis.on('error', (error) => log.warn({ error: error.message }, 'redis'))
    this.redis.on('message', () => this.look())
    void this.redis.subscribe(changesChannel(prefix)).catch(() => undefined)
    this.timer = setInterval(() => this.look(), 2000)
    this.timer.unref()
  }

  /** Opens a stream; `lastSeen` is the browser's Last-Event-ID after a lost connection. */
  async open(caller: Caller, res: Response, lastSeen: number | null): Promise<void> {
    const listener: Listener = { caller, res, upTo: 0 }
    const beat = setInterval(() => write(res, ': here\n\n'), 20_000)
    let closed = false
    res.on('close', () => { closed = true; clearInterval(beat); this.listeners.delete(listener) })
    const head = await lastLedgerId()
    if (closed) return
    // a number that the ledger has not reached is from nowhere
    listener.upTo = Math.min(lastSeen ?? head, head)
    res.writeHead(200, { 'content-type': 'text/event-stream', 'cache-control': 'no-store', 'x-accel-buffering': 'no', connection: 'keep-alive' })
    write(res, `retry: 1000\nid: ${listener.upTo}\nevent: hello\ndata: {}\n\n`)
    if (head - listener.upTo >= longest) {
      listener.upTo = head
      write(res, `id: ${head}\nevent: everything\ndata: {}\n\n`)
    }
    // what happened since is told before the stream joins the others, and again until nothing lies between
    do {
      for (const told of await readLedgerAfter(listener.upTo, longest)) tell(listener, told)
      if (closed) return
      if (this.listeners.size === 0) this.seen = listener.upTo
    } while (listener.upTo < this.seen)
    this.listeners.add(listener)
    this.look()
  }

  /** Reads on from the last number seen and tells each listener what they may know. One look at a time. */
  private look(): void {
    if (this.listeners.size === 0) return
    if (this.looking) { this.again = true; return }
    this.looking = this.readOn()
      .catch((error: unknown) => log.warn({ error: error instanceof Error ? error.message : String(error) }, 'could not read the ledger'))
      .finally(() => {
        this.looking = null
        if (this.again) { this.again = false; this.look() }
      })
  }

  private async readOn(): Promise<void> {
    for (;;) {
      const fresh = await readLedgerAfter(this.seen, 200)
      for (const told of fresh) {
        this.seen = told.id
        for (const listener of this.listeners) tell(listener, told)
      }
      if (fresh.length < 200) return
    }
  }

  close(): void {
    clearInterval(this.timer)
    this.redis.disconnect()
    for (const { res } of this.listeners) res.end()
    this.listeners.clear()
  }
}

function tell(listener: Listener, told: Told): void {
  const { caller, res } = listener
  if (told.id <= listener.upTo) return
  listener.upTo = told.id
  if (endsStreams.has(told.type) && told.subjectId === caller.person.id) {
    // with its number, so that a browser that is still signed in comes back past it
    write(res, `id: ${told.id}\nevent: ended\ndata: {}\n\n`)
    // the session is touched before the stream really ends; nothing more may be said meanwhile
    listener.upTo = Infinity
    return void res.end()
  }
  const changes = [{ subject: told.subject, id: told.subjectId }, ...told.touches].filter((change) => mayKnow(caller, change, told))
  if (changes.length > 0) write(res, `id: ${told.id}\nevent: changes\ndata: ${JSON.stringify(changes)}\n\n`)
}

/** Writing to a stream that was ended would end the process. */
function write(res: Response, text: string): void {
  if (res.writableEnded || res.destroyed) return
  res.write(text)
  if (res.writableLength > mostWaiting) res.destroy()
}

function mayKnow(caller: Caller, { subject: name, id }: Change, { customerId, siteId, jobState }: Told): boolean {
  const record = { id, customerId: customerId ?? undefined, siteId: siteId ?? undefined, personId: id, visibleToCustomer: true, ...(name === 'Job' && { state: jobState ?? undefined }) }
  return caller.ability.can('read', subject(name, record))
}
