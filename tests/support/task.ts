import { QueryTypes } from 'sequelize'
import { expect } from 'vitest'
import { database } from '../../server/database/connection.ts'
import type { EventType } from '../../shared/events.ts'
import { carryOut } from '../../worker/carry-out.ts'
import type { Task } from '../../worker/task.ts'

/** Runs a task for the newest event of a type, as the worker would; throws when there is none. */
export async function runTask(task: Task, type: EventType): Promise<void> {
  await carryOut({ eventId: await newestEvent(type), task: task.name }, [task])
}

/** Runs a task twice for the same event and expects the same state after both. */
export async function runTwice(task: Task, type: EventType, state: () => Promise<unknown>): Promise<void> {
  await runTask(task, type)
  const once = await state()
  await runTask(task, type)
  expect(await state()).toEqual(once)
}

/** Two workers with the same task at the same moment. */
export async function runAtOnce(task: Task, type: EventType): Promise<PromiseSettledResult<void>[]> {
  return Promise.allSettled([runTask(task, type), runTask(task, type)])
}

async function newestEvent(type: EventType): Promise<number> {
  const [event] = await database.query<{ id: number }>('select id from events where type = $1 order by id desc limit 1', { bind: [type], type: QueryTypes.SELECT })
  if (!event) throw new Error(`nothing of the kind ${type} has happened`)
  return event.id
}
