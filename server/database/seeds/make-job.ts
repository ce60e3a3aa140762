import { randomUUID } from 'node:crypto'
import { abilityFor } from '../../../shared/access/abilities.ts'
import type { Caller } from '../../caller.ts'
import { Payment } from '../../models/billing/payment.ts'
import { Job } from '../../models/jobs/job.ts'
import { Sample } from '../../models/jobs/sample.ts'
import { Person } from '../../models/people/person.ts'
import { Site } from '../../models/sites/site.ts'
import { settleAs } from '../../services/billing/settle-payment.ts'
import { draftJob } from '../../services/jobs/draft-job.ts'
import { saveDraft } from '../../services/jobs/save-draft.ts'
import { issueReport } from '../../services/reports/issue-report.ts'
import { planSite } from '../../services/planning/plan-site.ts'
import { receiveSample } from '../../services/samples/receive-sample.ts'
import type { DemoJob } from './demo-jobs.ts'
import { sites } from './demo-house.ts'
import { demoPassword, people } from './demo-people.ts'
import { measureSamples } from './measure-samples.ts'

const nobody = { person: null, requestId: 'seed' }

/** Takes one job of the demonstration as far as it should be, through the same use cases as people. */
export async function makeJob({ customer, site: siteKey, reach, order, hold }: DemoJob, seed: number): Promise<void> {
  const site = (await Site.findOne({ where: { name: sites.find(({ key }) => key === siteKey)!.name }, raw: true }))!
  const client = await callerAs(people.find((person) => person.role === 'client' && person.customer === customer)!.email)
  const draft = await draftJob({}, client)
  const saved = await saveDraft(draft.id, { version: draft.version, order: { ...order, siteId: site.id } }, client)
  if (reach === 'draft') return
  await pay(saved.id)
  await planSite(site.id, {}, nobody)
  if (reach === 'awaiting samples') return

  const bench = await callerAs(people.find((person) => person.role === 'technician' && person.site === siteKey)!.email)
  const samples = await Sample.findAll({ where: { jobId: saved.id }, order: [['position', 'ASC']], raw: true })
  for (const [at, sample] of samples.entries()) {
    const mismatch = hold?.row === at ? { reason: hold.reason, question: hold.question, answers: hold.answers } : null
    await receiveSample(sample.id, { version: sample.version, condition: 'Undamaged, marked', mismatch }, bench)
  }
  await planSite(site.id, {}, nobody)
  if (reach === 'received') return
  const reviewer = await callerAs(people.find((person) => person.role === 'manager' && (siteKey === 'O' ? person.site === 'O' : person.site === null))!.email)
  await measureSamples(samples.filter((_, at) => hold?.row !== at), { bench, reviewer: reach === 'in review' || reach === 'half measured' ? null : reviewer, stopAfter: reach === 'half measured' ? 1 : Infinity, seed })
  await planSite(site.id, {}, nobody)
  if (reach === 'reported') await issueReport(saved.id, { version: (await Job.findByPk(saved.id, { raw: true }))!.version, password: demoPassword }, reviewer)
}

async function pay(jobId: string): Promise<void> {
  const job = (await Job.findByPk(jobId, { raw: true }))!
  const { siteId, customerId, totalMinor: amountMinor, currency, version: jobVersion, number } = job
  const checkoutId = `cs_demo_${randomUUID()}`
  await Job.update({ waitsForPayment: true }, { where: { id: jobId } })
  await Payment.create({ jobId, siteId, customerId, amountMinor, currency, jobVersion, state: 'open', checkoutId, url: '' })
  await settleAs({ id: checkoutId, status: 'complete', paid: true, paymentIntentId: null, amountMinor, currency, reference: number, url: null }, nobody)
}

async function callerAs(email: string): Promise<Caller> {
  const person = (await Person.findOne({ where: { email }, raw: true }))!
  const siteIds = person.siteId ? [person.siteId] : person.customerId ? [] : (await Site.findAll({ raw: true })).map(({ id }) => id)
  const who = { id: person.id, name: person.name, email: person.email, role: person.role, customerId: person.customerId, siteIds }
  return { person: who, ability: abilityFor(who), requestId: 'seed' }
}
