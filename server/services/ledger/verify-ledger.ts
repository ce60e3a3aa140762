import { QueryTypes, Transaction } from 'sequelize'
import { database } from '../../database/connection.ts'
import { linkHash, type LedgerRow } from '../../database/ledger.ts'

type Stored = Omit<LedgerRow, 'at'> & { at: Date; previousHash: string; hash: string; customerPreviousHash: string | null; customerHash: string | null }
export type LedgerVerdict = { events: number; broken: { id: number; why: string } | null }

/** Walks the chain of the whole and of each customer from the first event and names the first broken link. */
export function verifyLedger(): Promise<LedgerVerdict> {
  // one snapshot for events and heads, or what is written meanwhile would look like a broken end
  return database.transaction({ isolationLevel: Transaction.ISOLATION_LEVELS.REPEATABLE_READ }, walk)
}

async function walk(transaction: Transaction): Promise<LedgerVerdict> {
  let previous = ''
  let last = 0
  const customers = new Map<string, string>()
  for (;;) {
    const rows = await database.query<Stored>(
      `select id, type, subject, subject_id as "subjectId", job_id as "jobId", customer_id as "customerId", site_id as "siteId", person_id as "personId", request_id as "requestId",
        at, touches, data, previous_hash as "previousHash", hash, customer_previous_hash as "customerPreviousHash", customer_hash as "customerHash"
       from events where id > $1 order by id limit 1000`,
      { bind: [last], type: QueryTypes.SELECT, transaction },
    )
    for (const row of rows) {
      const why = faultOf(row, previous, last, customers)
      if (why) return { events: last, broken: { id: row.id, why } }
      previous = row.hash
      last = row.id
      if (row.customerId) customers.set(row.customerId, row.customerHash ?? '')
    }
    if (rows.length < 1000) break
  }
  const heads = await database.query<{ chain: string; id: number; hash: string }>('select chain, event_id as id, hash from chain_heads', { type: QueryTypes.SELECT, transaction })
  const all = heads.find(({ chain }) => chain === 'all')
  if (!all || all.id !== last || all.hash !== previous) return { events: last, broken: { id: last + 1, why: 'events are missing from the end' } }
  for (const [customerId, hash] of customers) {
    if (heads.find(({ chain }) => chain === customerId)?.hash !== hash) return { events: last, broken: { id: last + 1, why: `the end of the chain of customer ${customerId} is not what was written` } }
  }
  return { events: last, broken: null }
}

function faultOf(stored: Stored, previous: string, last: number, customers: Map<string, string>): string | null {
  const { previousHash, hash, customerPreviousHash, customerHash, at, ...rest } = stored
  const row: LedgerRow = { ...rest, at: at.toISOString() }
  if (stored.id !== last + 1) return `event ${last + 1} is missing`
  if (previousHash !== previous) return 'it does not continue the event before it'
  if (linkHash(previous, row) !== hash) return 'what it says is not what was written'
  if (!row.customerId) return null
  const own = customers.get(row.customerId) ?? ''
  if (customerPreviousHash !== own) return "it does not continue its customer's chain"
  return linkHash(own, row) === customerHash ? null : "its customer's chain is broken"
}
