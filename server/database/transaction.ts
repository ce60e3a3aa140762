import { DatabaseError, type Transaction } from 'sequelize'
import { announce } from './announce.ts'
import { database } from './connection.ts'
import { appendEvents, type Happening } from './ledger.ts'

/** Whoever changes something: a signed-in person, or a task of the worker. */
export type Actor = { person: { id: string } | null; requestId: string }

/** A transaction that also keeps what happened; pass it as `transaction` to every query in it. */
export type Tx = Transaction & { record(happening: Happening): void }

/**
 * Runs a change and writes its events in the same transaction: both are there, or neither. A deadlock is tried again,
 * so `work` must change nothing outside the database.
 */
export async function inTransaction<T>(actor: Actor, work: (tx: Tx) => Promise<T>): Promise<T> {
  for (let attempt = 1; ; attempt += 1) {
    try {
      return await once(actor, work)
    } catch (error) {
      if (attempt >= 3 || !isDeadlock(error)) throw error
    }
  }
}

async function once<T>(actor: Actor, work: (tx: Tx) => Promise<T>): Promise<T> {
  const happenings: Happening[] = []
  let last = 0
  const result = await database.transaction(async (transaction) => {
    const tx: Tx = Object.assign(transaction, { record: (happening: Happening) => void happenings.push(happening) })
    const value = await work(tx)
    if (happenings.length > 0) last = await appendEvents(happenings, { personId: actor.person?.id ?? null, requestId: actor.requestId }, tx)
    return value
  })
  if (last > 0) announce(last)
  return result
}

const isDeadlock = (error: unknown) => error instanceof DatabaseError && (error.original as { code?: string }).code === '40P01'
