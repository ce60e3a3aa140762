import { DateTime } from 'luxon'
import { QueryTypes } from 'sequelize'
import type { Queue, QueueItem } from '../../../shared/api/benches.ts'
import { methodOf } from '../../../shared/methods.ts'
import { sizeText } from '../../../shared/orders/size-text.ts'
import type { Piece } from '../../../shared/method/piece.ts'
import type { JobState } from '../../../shared/api/words.ts'
import { database } from '../../database/connection.ts'
import type { Caller } from '../../caller.ts'
import { loadOne } from '../../models/load.ts'
import { Bench } from '../../models/sites/bench.ts'
import { Site } from '../../models/sites/site.ts'
import { daysLate } from '../jobs/view/job-view.ts'
import { travellersOf } from '../samples/views-of-samples.ts'
import { benchViews } from './bench-views.ts'

type Row = {
  stepId: string; sampleId: string; sampleNumber: string; jobId: string; testId: string | null; capability: string; stepLabel: string; testLabel: string | null; material: string; piece: Piece
  plannedStart: Date | null; plannedEnd: Date | null; state: 'planned' | 'started'; receivedAt: Date | null; onHold: boolean; runId: string | null; sentBack: boolean; waitsFor: string | null
  jobState: JobState; neededBy: string | null; promisedAt: Date | null; expectedAt: Date | null
}

/** How many steps a queue shows; nobody looks further ahead at a bench. */
const longest = 60

/** What is planned at a bench, in order, with what stands in the way. */
export async function readQueue(benchId: string, caller: Caller): Promise<Queue> {
  const bench = await loadOne(Bench, 'Bench', benchId, caller)
  const site = (await Site.findByPk(bench.siteId, { raw: true }))!
  const rows = await database.query<Row>(
    `select s.id as "stepId", s.sample_id as "sampleId", m.number as "sampleNumber", s.job_id as "jobId", s.test_id as "testId", s.capability, s.label as "stepLabel", t.label as "testLabel",
      m.material, m.piece, e.starts_at as "plannedStart", e.ends_at as "plannedEnd", s.state, m.received_at as "receivedAt", m.on_hold as "onHold",
      (select r.id from test_runs r where r.test_id = s.test_id and r.state = 'open' and s.capability = r.method_id) as "runId",
      exists (select 1 from test_runs r where r.test_id = s.test_id and r.state = 'sent back' and s.capability = r.method_id) as "sentBack",
      (select w.label from steps w where w.sample_id = s.sample_id and w.position < s.position and w.state not in ('done', 'void') and (w.test_id is null or w.test_id = s.test_id) order by w.position limit 1) as "waitsFor",
      j.state as "jobState", j.needed_by as "neededBy", j.promised_at as "promisedAt", j.expected_at as "expectedAt"
     from steps s join samples m on m.id = s.sample_id join jobs j on j.id = s.job_id left join tests t on t.id = s.test_id left join plan_entries e on e.step_id = s.id
     where coalesce(case when s.state = 'started' then s.bench_id end, e.bench_id) = $1 and s.state in ('planned', 'started')
     order by (s.state = 'started') desc, e.starts_at nulls last, m.number limit ${longest}`,
    { bind: [benchId], type: QueryTypes.SELECT },
  )
  const travellers = await travellersOf([...new Set(rows.map(({ sampleId }) => sampleId))])
  const startOfDay = DateTime.now().setZone(site.timeZone).startOf('day').toJSDate()
  const [done] = await database.query<{ count: number; last: Date | null }>(`select count(*) as count, max(ended_at) as last from steps where bench_id = $1 and state = 'done' and ended_at >= $2`, { bind: [benchId, startOfDay], type: QueryTypes.SELECT })
  return {
    bench: (await benchViews([bench]))[0]!, doneToday: Number(done?.count ?? 0), lastDoneAt: done?.last?.toISOString() ?? null, timeZone: site.timeZone,
    items: rows.map((row): QueueItem => ({
      stepId: row.stepId, sampleId: row.sampleId, sampleNumber: row.sampleNumber, jobId: row.jobId, testId: methodOf(row.capability) ? row.testId : null, runId: row.runId,
      methodId: methodOf(row.capability) ? row.capability : null, label: methodOf(row.capability) ? (row.testLabel ?? row.stepLabel) : row.stepLabel, material: [row.material, sizeText(row.piece)].filter(Boolean).join(', '),
      plannedStart: row.plannedStart?.toISOString() ?? null, plannedEnd: row.plannedEnd?.toISOString() ?? null, state: row.state, isHere: row.receivedAt !== null, onHold: row.onHold,
      lateDays: daysLate({ state: row.jobState, neededBy: row.neededBy, promisedAt: row.promisedAt, expectedAt: row.expectedAt }, site.timeZone, null), note: noteOf(row), traveller: travellers.get(row.sampleId) ?? [],
    })),
  }
}

/** The one thing that matters before this step can begin. */
function noteOf(row: Row): string {
  if (row.onHold) return 'on hold'
  if (!row.receivedAt) return 'sample not here yet'
  if (row.sentBack) return 'sent back by review'
  return row.waitsFor && row.state === 'planned' ? `${row.waitsFor} first` : ''
}
