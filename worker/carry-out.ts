import { QueryTypes } from 'sequelize'
import { database } from '../server/database/connection.ts'
import { outside } from '../server/integrations/outside.ts'
import type { Handed } from './relay.ts'
import type { Task } from './task.ts'

/** Does one piece of handed work, unless it is done already, and notes that it is done. */
export async function carryOut({ eventId, task: name }: Handed, tasks: readonly Task[]): Promise<void> {
  const task = tasks.find((one) => one.name === name)
  if (!task) throw new Error(`no task is called ${name}`)
  const [event] = await database.query<{ subjectId: string; jobId: string | null; customerId: string | null; siteId: string | null; data: Record<string, unknown>; state: string | null }>(
    `select e.subject_id as "subjectId", e.job_id as "jobId", e.customer_id as "customerId", e.site_id as "siteId", e.data, d.state
     from events e left join task_deliveries d on d.event_id = e.id and d.task = $2 where e.id = $1`,
    { bind: [eventId, name], type: QueryTypes.SELECT },
  )
  if (!event) throw new Error(`there is no event ${eventId}`)
  const { data, state, ...told } = event
  if (state === 'done') return
  await task.run({ ...data, ...told, eventId }, outside())
  await database.query(`update task_deliveries set state = 'done', done_at = now(), error = null where event_id = $1 and task = $2`, { bind: [eventId, name] })
}

/** Notes that a task was tried as often as it may be; a person has to look at it. */
export async function giveUp({ eventId, task }: Handed, error: Error): Promise<void> {
  await database.query(`update task_deliveries set state = 'given up', error = $3 where event_id = $1 and task = $2 and state <> 'done'`, { bind: [eventId, task, error.message.slice(0, 2000)] })
}
