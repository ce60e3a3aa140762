import { Op } from 'sequelize'
import type { ReviewItem } from '../../../shared/api/test-runs.ts'
import type { Caller } from '../../caller.ts'
import { accessibleWhere } from '../../models/accessible.ts'
import { Job } from '../../models/jobs/job.ts'
import { Sample } from '../../models/jobs/sample.ts'
import { Test } from '../../models/jobs/test.ts'
import { Customer } from '../../models/people/customer.ts'
import { Person } from '../../models/people/person.ts'
import { TestRun } from '../../models/runs/test-run.ts'
import { travellersOf } from '../samples/views-of-samples.ts'

/** Runs that wait for review, the most urgent first; an own run is listed and marked, for it waits for someone else. */
export async function listReviews(caller: Caller): Promise<{ items: ReviewItem[] }> {
  const where = accessibleWhere(caller.ability, 'read', 'TestRun')
  if (!where) return { items: [] }
  const runs = await TestRun.findAll({ where: { [Op.and]: [{ state: 'recorded' }, where] }, order: [['recordedAt', 'ASC']], limit: 500, raw: true })
  const among = (ids: string[]) => ({ where: { id: { [Op.in]: [...new Set(ids)] } }, raw: true as const })
  const [tests, samples, jobs, people, travellers] = await Promise.all([
    Test.findAll(among(runs.map(({ testId }) => testId))), Sample.findAll(among(runs.map(({ sampleId }) => sampleId))), Job.findAll(among(runs.map(({ jobId }) => jobId))),
    Person.findAll(among(runs.map(({ performedById }) => performedById))), travellersOf([...new Set(runs.map(({ sampleId }) => sampleId))]),
  ])
  const customers = await Customer.findAll(among(jobs.map(({ customerId }) => customerId)))
  const items = runs.map((run): ReviewItem => {
    const job = jobs.find(({ id }) => id === run.jobId)!
    return {
      testRunId: run.id, sampleNumber: samples.find(({ id }) => id === run.sampleId)!.number, label: tests.find(({ id }) => id === run.testId)!.label,
      performedBy: people.find(({ id }) => id === run.performedById)?.name ?? '', isOwn: run.performedById === caller.person.id, neededBy: job.neededBy, recordedAt: run.recordedAt!.toISOString(),
      unusual: run.evaluation?.checks.filter(({ severity }) => severity === 'warning').length ?? 0, traveller: travellers.get(run.sampleId) ?? [], jobId: run.jobId,
      customerName: customers.find(({ id }) => id === job.customerId)?.name ?? '',
    }
  })
  return { items: items.sort((a, b) => (a.neededBy ?? '9999').localeCompare(b.neededBy ?? '9999')) }
}
