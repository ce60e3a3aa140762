import { randomBytes } from 'node:crypto'
import type { CreationAttributes, Model, ModelStatic } from 'sequelize'
import { v7 } from 'uuid'
import { Problem } from '../../../shared/problems.ts'
import { orderedTests } from '../../../shared/orders/ordered-test.ts'
import { travellerSteps } from '../../../shared/orders/traveller-steps.ts'
import type { Tx } from '../../database/transaction.ts'
import { Invoice } from '../../models/billing/invoice.ts'
import type { Payment } from '../../models/billing/payment.ts'
import { Job } from '../../models/jobs/job.ts'
import { Sample } from '../../models/jobs/sample.ts'
import { Step } from '../../models/jobs/step.ts'
import { Test } from '../../models/jobs/test.ts'
import { Company } from '../../models/people/company.ts'
import { Site } from '../../models/sites/site.ts'
import { dayIn } from '../jobs/day-in.ts'
import { nextNumber } from '../jobs/next-number.ts'

type NewRow<T extends ModelStatic<Model>> = CreationAttributes<InstanceType<T>>

/** Turns a paid draft into work: samples, tests and steps come to be, and the invoice gets its number. The job must be locked. */
export async function placeJob(job: Job, payment: Payment, promisedAt: Date | null, tx: Tx): Promise<void> {
  const now = new Date()
  const { id: jobId, customerId, siteId, order } = job
  const samples: NewRow<typeof Sample>[] = []
  const tests: NewRow<typeof Test>[] = []
  const steps: NewRow<typeof Step>[] = []
  for (const [index, { heat, lot, material, piece, ...ordered }] of order.samples.entries()) {
    const sampleId = v7()
    samples.push({ id: sampleId, jobId, customerId, siteId, position: index + 1, number: `${job.number}-${String(index + 1).padStart(2, '0')}`, code: scanCode(), heat, lot, material, piece, state: 'expected' })
    const own = orderedTests(order, { heat, lot, material, piece, ...ordered }).map(({ method, parameters, label, column }) => {
      if (!method || !parameters) throw new Problem('not-acceptable', `sample ${index + 1} of ${job.number} has a test that cannot be placed: ${label}`)
      return { id: v7(), method, parameters, label, requirement: column.requirement, needs: method.needs(parameters) }
    })
    tests.push(...own.map(({ id, method, parameters, label, requirement }, at) => ({
      id, jobId, sampleId, customerId, siteId, position: at + 1, methodId: method.id, methodVersion: method.version, label, parameters, requirement, state: 'waiting' as const,
    })))
    steps.push(...travellerSteps(own).map(({ type, label, capability, test, need }, at) => ({
      id: v7(), jobId, sampleId, siteId, testId: test === null ? null : (own[test]?.id ?? null), position: at + 1, type, label, capability, need, state: 'to come' as const,
    })))
  }
  await Job.update({ state: 'placed', money: 'paid', waitsForPayment: false, placedAt: now, promisedAt, expectedAt: promisedAt, version: job.version + 1 }, { where: { id: jobId }, transaction: tx })
  await Sample.bulkCreate(samples, { transaction: tx })
  await Test.bulkCreate(tests, { transaction: tx })
  await Step.bulkCreate(steps, { transaction: tx })
  const invoice = await invoiceFor(job, payment, now, tx)
  const about = { jobId, customerId, siteId }
  tx.record({
    type: 'job.placed', id: jobId, ...about, data: { number: job.number, text: `${samples.length} samples, ${tests.length} tests` },
    touches: [{ subject: 'Sample', id: jobId }, { subject: 'Test', id: jobId }, { subject: 'PlanEntry', id: jobId }],
  })
  tx.record({ type: 'payment.received', id: invoice.id, ...about, data: { paymentId: payment.id, invoice: invoice.number, amountMinor: payment.amountMinor, currency: payment.currency }, touches: [{ subject: 'Job', id: jobId }] })
}

async function invoiceFor(job: Job, payment: Payment, now: Date, tx: Tx): Promise<{ id: string; number: string }> {
  const site = await Site.findByPk(job.siteId, { raw: true, transaction: tx })
  const company = await Company.findOne({ raw: true, transaction: tx })
  if (!site || !company) throw new Error('no site or company to invoice from')
  const { id: jobId, customerId, siteId, currency, lines, netMinor, taxMinor, totalMinor } = job
  const number = await nextNumber('I', now, tx)
  const { id } = await Invoice.create({
    number, jobId, customerId, siteId, issuedOn: dayIn(site.timeZone, now), currency, lines, netMinor, taxPercent: company.taxPercent, taxMinor, totalMinor, paidMinor: payment.amountMinor,
  }, { transaction: tx })
  return { id, number }
}

/** Crockford's 32 characters: none is taken for another on a smudged label. */
const alphabet = '0123456789ABCDEFGHJKMNPQRSTVWXYZ'

/** What a sample's label says to a scanner: 50 random bits, so that no code can be guessed from another. */
function scanCode(): string {
  return `S-${[...randomBytes(10)].map((byte) => alphabet[byte % 32]).join('')}`
}
