import { QueryTypes } from 'sequelize'
import type { Sample as SampleView, StepInSample } from '../../../shared/api/samples.ts'
import { database } from '../../database/connection.ts'
import type { Caller } from '../../caller.ts'
import { File } from '../../models/jobs/file.ts'
import { Hold } from '../../models/jobs/hold.ts'
import { Job } from '../../models/jobs/job.ts'
import { Sample } from '../../models/jobs/sample.ts'
import { loadOne } from '../../models/load.ts'
import { Customer } from '../../models/people/customer.ts'
import { Site } from '../../models/sites/site.ts'
import { fileView } from '../files/file-view.ts'
import { holdViews } from '../jobs/talk/hold-views.ts'
import { viewsOfSamples } from './views-of-samples.ts'

type StepRow = Omit<StepInSample, 'plannedStart' | 'plannedEnd' | 'startedAt' | 'endedAt'> & { plannedStart: Date | null; plannedEnd: Date | null; startedAt: Date | null; endedAt: Date | null }

/** One sample with its traveller, plan, holds and photos, for whoever may see it. Why the plan is as it is stays in the house. */
export async function sampleView(sampleId: string, caller: Caller): Promise<SampleView> {
  const sample = await loadOne(Sample, 'Sample', sampleId, caller)
  const [job, site, views, steps, holds, photos] = await Promise.all([
    Job.findByPk(sample.jobId, { raw: true }), Site.findByPk(sample.siteId, { raw: true }), viewsOfSamples([sample]), stepsOf(sampleId),
    Hold.findAll({ where: { sampleId }, order: [['id', 'ASC']], raw: true }), File.findAll({ where: { sampleId, purpose: 'photo', removedAt: null }, order: [['id', 'ASC']], raw: true }),
  ])
  const customer = job && (await Customer.findByPk(job.customerId, { raw: true }))
  if (!job || !site || !customer) throw new Error(`sample ${sample.number} has lost what it belongs to`)
  const knowsPlan = caller.ability.can('read', 'PlanEntry')
  const next = steps.find(({ state }) => state !== 'done' && state !== 'void')
  return {
    ...views.get(sampleId)!, jobId: sample.jobId, jobNumber: job.number, customerName: customer.name, siteName: site.name, timeZone: site.timeZone, purchaseOrder: job.purchaseOrder, version: sample.version,
    steps: steps.map((step) => (knowsPlan ? step : { ...step, why: '', rejected: [], personName: null, unplacedBecause: null })), holds: await holdViews(holds), photos: photos.map(fileView),
    next: next && sample.receivedAt && !sample.onHold ? { stepId: next.id, label: next.label, testId: next.testId, benchId: next.benchId } : null,
  }
}

async function stepsOf(sampleId: string): Promise<StepInSample[]> {
  const rows = await database.query<StepRow>(
    `select s.id, s.position, s.label, s.type as kind, s.capability, s.test_id as "testId", s.state, coalesce(s.bench_id, e.bench_id) as "benchId", b.name as "benchName", p.name as "personName",
      e.starts_at as "plannedStart", e.ends_at as "plannedEnd", s.started_at as "startedAt", s.ended_at as "endedAt", coalesce(e.why, '') as why, coalesce(e.rejected, '[]') as rejected, e.unplaced_because as "unplacedBecause"
     from steps s left join plan_entries e on e.step_id = s.id left join benches b on b.id = coalesce(s.bench_id, e.bench_id) left join people p on p.id = coalesce(s.started_by_id, e.person_id)
     where s.sample_id = $1 order by s.position`,
    { bind: [sampleId], type: QueryTypes.SELECT },
  )
  const iso = (date: Date | null) => date?.toISOString() ?? null
  return rows.map((row) => ({ ...row, plannedStart: iso(row.plannedStart), plannedEnd: iso(row.plannedEnd), startedAt: iso(row.startedAt), endedAt: iso(row.endedAt) }))
}
