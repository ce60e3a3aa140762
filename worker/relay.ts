import type { Queue } from 'bullmq'
import { QueryTypes } from 'sequelize'
import { v7 } from 'uuid'
import { database } from '../server/database/connection.ts'
import type { Task } from './task.ts'

/** A queued piece of work: one task for one event. The event itself is read from the ledger when the work is done. */
export type Handed = { eventId: number; task: string }

const batch = 200

/**
 * Hands events that no one has handed yet to the tasks that name them. The cursor's row is locked meanwhile, so two
 * workers never hand the same events; if the queue cannot be reached nothing moves and it is tried again. Gives how many
 * events it passed.
 */
export async function relayOnce(queue: Queue<Handed>, tasks: readonly Task[]): Promise<number> {
  return database.transaction(async (transaction) => {
    const [cursor] = await database.query<{ id: number }>(`select event_id as id from relay_cursors where name = 'tasks' for update skip locked`, { transaction, type: QueryTypes.SELECT })
    if (!cursor) return 0
    const events = await database.query<{ id: number; type: string }>('select id, type from events where id > $1 order by id limit $2', { transaction, bind: [cursor.id, batch], type: QueryTypes.SELECT })
    const last = events.at(-1)
    if (!last) return 0
    const work = events.flatMap(({ id, type }) => tasks.filter((one) => one.on.some((name) => name === type)).map((one) => ({ eventId: id, task: one.name, attempts: one.attempts })))
    for (const { eventId, task } of work) {
      await database.query(`insert into task_deliveries (id, event_id, task, state, handed_at) values ($1, $2, $3, 'handed', now()) on conflict do nothing`, { transaction, bind: [v7(), eventId, task] })
    }
    await hand(queue, work)
    await database.query(`update relay_cursors set event_id = $1 where name = 'tasks'`, { transaction, bind: [last.id] })
    return events.length
  })
}

/** Hands again what was handed long ago and is not done: the queue was emptied, or a worker died. Handing twice is harmless. */
export async function handAgain(queue: Queue<Handed>, tasks: readonly Task[], olderThanSeconds: number): Promise<number> {
  const open = await database.query<{ eventId: number; task: string }>(
    `update task_deliveries set handed_at = now() where id in (
       select id from task_deliveries where state = 'handed' and handed_at < now() - make_interval(secs => $1) order by handed_at limit 500 for update skip locked)
     returning event_id as "eventId", task`,
    { bind: [olderThanSeconds], type: QueryTypes.SELECT },
  )
  await hand(queue, open.map((one) => ({ ...one, attempts: tasks.find(({ name }) => name === one.task)?.attempts ?? 1 })))
  return open.length
}

async function hand(queue: Queue<Handed>, work: readonly (Handed & { attempts: number })[]): Promise<void> {
  if (work.length === 0) return
  await queue.addBulk(work.map(({ eventId, task, attempts }) => ({
    name: task,
    data: { eventId, task },
    opts: { jobId: `${task}-${eventId}`, attempts, backoff: { type: 'exponential', delay: 1000 }, removeOnComplete: true, removeOnFail: true },
  })))
}
