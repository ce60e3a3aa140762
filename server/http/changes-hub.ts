import { subject } from '@casl/ability'
import type { Response } from 'express'
import { Redis } from 'ioredis'
import type { Change } from '../../shared/api/changes.ts'
import type { SubjectName } from '../../shared/api/permission.ts'
import type { Caller } from '../caller.ts'
import { changesChannel } from '../integrations/changes-channel.ts'
import { lastLedgerId, readLedgerAfter, type Told } from '../services/ledger/read-ledger.ts'
import { log } from './log.ts'

type Listener = { caller: Caller; res: Response }

/** A stream that falls further behind than this is told to fetch everything anew. */
const longest = 1000
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
    res.writeHead(200, { 'content-type': 'text/event-stream', 'cache-control': 'no-store', 'x-accel-buffering': 'no', connection: 'keep-alive' })
    const listener = { caller, res }
    const start = lastSeen ?? (await lastLedgerId())
    res.write(`retry: 1000\nid: ${start}\nevent: hello\ndata: {}\n\n`)
    if (this.listeners.size === 0) this.seen = start
    const missed = lastSeen === null ? [] : await readLedgerAfter(lastSeen, longest)
    if (missed.length === longest) res.write(`id: ${await lastLedgerId()}\nevent: everything\ndata: {}\n\n`)
    else for (const told of missed) tell(listener, told)
    const beat = setInterval(() => res.write(': here\n\n'), 20_000)
    res.on('close', () => { clearInterval(beat); this.listeners.delete(listener) })
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

function tell({ caller, res }: Listener, told: Told): void {
  if (endsStreams.has(told.type) && told.subjectId === caller.person.id) return void res.end()
  const changes = [{ subject: told.subject, id: told.subjectId }, ...told.touches].filter((change) => mayKnow(caller, change, told))
  if (changes.length > 0) res.write(`id: ${told.id}\nevent: changes\ndata: ${JSON.stringify(changes)}\n\n`)
}

function mayKnow(caller: Caller, { subject: name, id }: Change, { customerId, siteId }: Told): boolean {
  const record = { id, customerId: customerId ?? undefined, siteId: siteId ?? undefined, personId: id, visibleToCustomer: true }
  return caller.ability.can('read', subject(name as SubjectName, record) as never)
}
