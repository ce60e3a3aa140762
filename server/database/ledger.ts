import { createHash } from 'node:crypto'
import { QueryTypes, type Transaction } from 'sequelize'
import type { Change } from '../../shared/api/changes.ts'
import { events, type EventType } from '../../shared/events.ts'
import { database } from './connection.ts'

/** Something that happened, as a use case says it. `touches` names further things whose screens should refetch. */
export type Happening = {
  type: EventType
  id: string
  jobId?: string | null
  customerId?: string | null
  siteId?: string | null
  data?: Record<string, unknown>
  touches?: Change[]
}

/** A row of the ledger without its hashes. */
export type LedgerRow = {
  id: number; type: string; subject: string; subjectId: string; jobId: string | null; customerId: string | null; siteId: string | null; personId: string | null
  requestId: string | null; at: string; touches: Change[]; data: Record<string, unknown>
}

/** The link of the chain: SHA-256 over the link before and everything the row says, in a fixed order. */
export function linkHash(previous: string, row: LedgerRow): string {
  const said = [row.id, row.type, row.subject, row.subjectId, row.jobId, row.customerId, row.siteId, row.personId, row.requestId, row.at, sorted(row.touches), sorted(row.data)]
  return createHash('sha256').update(previous).update('\n').update(JSON.stringify(said)).digest('hex')
}

/** JSON keeps no order of keys in the database, so the hash is made over keys in order. */
function sorted(value: unknown): unknown {
  if (Array.isArray(value)) return value.map(sorted)
  if (typeof value !== 'object' || value === null) return value
  return Object.fromEntries(Object.entries(value).sort(([a], [b]) => (a < b ? -1 : 1)).map(([key, inner]) => [key, sorted(inner)]))
}

/**
 * Writes events to the end of the ledger. The head of the chain is locked until commit, so numbers ascend in the order
 * of commits and a reader that has seen one number has seen all before it. Gives the last number.
 */
export async function appendEvents(happenings: readonly Happening[], actor: { personId: string | null; requestId: string }, tx: Transaction): Promise<number> {
  const head = await lockHead('all', tx)
  let { id, hash } = head
  for (const happening of happenings) {
    id += 1
    const row: LedgerRow = {
      id, type: happening.type, subject: events[happening.type], subjectId: happening.id, jobId: happening.jobId ?? null, customerId: happening.customerId ?? null,
      siteId: happening.siteId ?? null, personId: actor.personId, requestId: actor.requestId, at: new Date().toISOString(), touches: happening.touches ?? [],
      data: JSON.parse(JSON.stringify(happening.data ?? {})) as Record<string, unknown>,
    }
    const link = linkHash(hash, row)
    const own = row.customerId ? await lockHead(row.customerId, tx) : null
    const ownLink = own ? linkHash(own.hash, row) : null
    await database.query(
      `insert into events (id, type, subject, subject_id, job_id, customer_id, site_id, person_id, request_id, at, touches, data, previous_hash, hash, customer_previous_hash, customer_hash)
       values ($1, $2, $3, $4, $5, $6, $7, $8, $9, $10, $11::jsonb, $12::jsonb, $13, $14, $15, $16)`,
      { transaction: tx, bind: [row.id, row.type, row.subject, row.subjectId, row.jobId, row.customerId, row.siteId, row.personId, row.requestId, row.at, JSON.stringify(row.touches), JSON.stringify(row.data), hash, link, own?.hash ?? null, ownLink] },
    )
    if (row.customerId && ownLink) await moveHead(row.customerId, id, ownLink, tx)
    hash = link
  }
  await moveHead('all', id, hash, tx)
  return id
}

async function lockHead(chain: string, tx: Transaction): Promise<{ id: number; hash: string }> {
  const [head] = await database.query<{ id: number; hash: string }>('select event_id as id, hash from chain_heads where chain = $1 for update', { transaction: tx, bind: [chain], type: QueryTypes.SELECT })
  return head ?? { id: 0, hash: '' }
}

async function moveHead(chain: string, id: number, hash: string, tx: Transaction): Promise<void> {
  await database.query('insert into chain_heads (chain, event_id, hash) values ($1, $2, $3) on conflict (chain) do update set event_id = $2, hash = $3', { transaction: tx, bind: [chain, id, hash] })
}
