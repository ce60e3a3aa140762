import { DateTime } from 'luxon'
import { Op, QueryTypes } from 'sequelize'
import type { Floor, FloorStrip } from '../../../shared/api/benches.ts'
import { database } from '../../database/connection.ts'
import type { Caller } from '../../caller.ts'
import { accessibleWhere } from '../../models/accessible.ts'
import { Plan } from '../../models/jobs/plan.ts'
import { Bench } from '../../models/sites/bench.ts'
import { Site } from '../../models/sites/site.ts'
import { instantOf, minuteOf, openIntervals } from './plan-clock.ts'

type StepRow = {
  stepId: string; benchId: string; jobId: string; jobNumber: string; label: string; start: Date; end: Date; state: 'planned' | 'started' | 'done'; sampleNumber: string; receivedAt: Date | null
  jobState: string; person: string | null; why: string; rejected: { bench: string; because: string }[]
}
type UnplacedRow = { stepId: string; jobId: string; jobNumber: string; sampleNumber: string; label: string; because: string; cures: string[] }

/** Benches against days for the caller's sites: what is done, running and planned, and what has no place yet. */
export async function readFloor({ siteId, days }: { siteId?: string; days: number }, caller: Caller): Promise<Floor> {
  const allowed = accessibleWhere(caller.ability, 'read', 'Bench')
  const benches = allowed ? await Bench.findAll({ where: { [Op.and]: [allowed, siteId ? { siteId } : {}] }, order: [['code', 'ASC']], raw: true }) : []
  const sites = await Site.findAll({ where: { id: { [Op.in]: [...new Set(benches.map((bench) => bench.siteId))] } }, order: [['createdAt', 'ASC'], ['name', 'ASC']], raw: true })
  const zone = sites[0]?.timeZone ?? 'UTC'
  const shown = workingDays(DateTime.now().setZone(zone).startOf('day'), days)
  const [from, to] = [shown[0]!.toJSDate(), shown.at(-1)!.plus({ days: 1 }).toJSDate()]
  const plans = await Plan.findAll({ where: { siteId: { [Op.in]: sites.map(({ id }) => id) } }, raw: true })
  const steps = await stepsBetween(benches.map(({ id }) => id), from, to)
  const strips = stripsOf(steps)
  return {
    madeAt: plans.map(({ madeAt }) => madeAt.toISOString()).sort().at(-1) ?? null, from: from.toISOString(), to: to.toISOString(), days: shown.map((day) => ({ day: day.toFormat('yyyy-MM-dd') })),
    sites: sites.map((site) => ({
      id: site.id, name: site.name, timeZone: site.timeZone,
      benches: benches.filter((bench) => bench.siteId === site.id).map((bench) => {
        const open = openIntervals(bench.hours, site.timeZone, minuteOf(from), minuteOf(to))
        return {
          id: bench.id, name: bench.name, code: bench.code, out: bench.out, open: open.map(([start, end]) => ({ start: instantOf(start).toISOString(), end: instantOf(end).toISOString() })),
          openMinutes: open.reduce((sum, [start, end]) => sum + end - start, 0) * bench.units,
          heldMinutes: steps.filter(({ benchId }) => benchId === bench.id).reduce((sum, { start, end }) => sum + Math.round((Math.min(end.getTime(), to.getTime()) - Math.max(start.getTime(), from.getTime())) / 60_000), 0),
        }
      }),
    })),
    strips, unplaced: await unplacedAt(sites.map(({ id }) => id)),
  }
}

/** Days from today on, weekends left out. */
function workingDays(from: DateTime, count: number): DateTime[] {
  const found: DateTime[] = []
  for (let day = from; found.length < count; day = day.plus({ days: 1 })) if (day.weekday <= 5 || (found.length === 0 && day.equals(from))) found.push(day)
  return found
}

function stepsBetween(benchIds: string[], from: Date, to: Date): Promise<StepRow[]> {
  return database.query<StepRow>(
    `select s.id as "stepId", coalesce(s.bench_id, e.bench_id) as "benchId", s.job_id as "jobId", j.number as "jobNumber", s.label, coalesce(s.started_at, e.starts_at) as start,
      coalesce(s.ended_at, greatest(e.ends_at, s.started_at + interval '5 minutes', case when s.state = 'started' then now() end)) as end, s.state, m.number as "sampleNumber", m.received_at as "receivedAt", j.state as "jobState",
      p.name as person, coalesce(e.why, '') as why, coalesce(e.rejected, '[]') as rejected
     from steps s join samples m on m.id = s.sample_id join jobs j on j.id = s.job_id left join plan_entries e on e.step_id = s.id left join people p on p.id = coalesce(s.started_by_id, e.person_id)
     where coalesce(s.bench_id, e.bench_id) = any($1::uuid[]) and s.state in ('planned', 'started', 'done') and coalesce(s.started_at, e.starts_at) < $3
       and (s.state = 'started' or coalesce(s.ended_at, e.ends_at) > $2) order by 2, 6, m.number`,
    { bind: [benchIds, from, to], type: QueryTypes.SELECT },
  )
}

/** Neighbouring steps of one job in the same state on one bench are one strip. */
function stripsOf(steps: readonly StepRow[]): FloorStrip[] {
  const strips: FloorStrip[] = []
  for (const step of steps) {
    const last = strips.at(-1)
    const near = last && last.benchId === step.benchId && last.jobId === step.jobId && last.state === step.state && last.label === step.label && step.start.getTime() - Date.parse(last.end) <= 5 * 60_000
    if (near) {
      last.stepIds.push(step.stepId)
      last.sampleNumbers.push(step.sampleNumber)
      last.end = new Date(Math.max(Date.parse(last.end), step.end.getTime())).toISOString()
    } else {
      strips.push({
        benchId: step.benchId, stepIds: [step.stepId], jobId: step.jobId, jobNumber: step.jobNumber, label: step.label, start: step.start.toISOString(), end: step.end.toISOString(), state: step.state,
        stage: step.receivedAt ? 'in work' : step.jobState === 'placed' ? 'placed' : 'awaiting samples', sampleNumbers: [step.sampleNumber], person: step.person, why: step.why, rejected: step.rejected,
      })
    }
  }
  return strips
}

function unplacedAt(siteIds: string[]): Promise<UnplacedRow[]> {
  return database.query<UnplacedRow>(
    `select e.step_id as "stepId", s.job_id as "jobId", j.number as "jobNumber", m.number as "sampleNumber", s.label, e.unplaced_because as because, e.cures
     from plan_entries e join steps s on s.id = e.step_id join samples m on m.id = s.sample_id join jobs j on j.id = s.job_id
     where e.unplaced_because is not null and e.site_id = any($1::uuid[]) order by m.number, s.position limit 200`,
    { bind: [siteIds], type: QueryTypes.SELECT },
  )
}
