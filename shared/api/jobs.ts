import * as z from 'zod'
import { Piece } from '../method/piece.ts'
import { Day, Id, Instant, Money, OptionalText, page, PageQuery, Text, Traveller, Version } from './basics.ts'
import { endpoint } from './endpoint.ts'
import { afterwardsChoices, Order, Quote, Requirement } from './orders.ts'
import { Currency, JobState, MoneyState, ReportState, SampleState, TestState } from './words.ts'

/** A job as a row of a list. `what` and `tests` say its content in words. */
export const JobRow = z.object({
  id: Id, number: z.string(), customerName: z.string(), siteName: z.string(), purchaseOrder: z.string(), what: z.string(), tests: z.string(),
  state: JobState, money: MoneyState, waitsForPayment: z.boolean(), holds: z.int(), traveller: Traveller,
  neededBy: Day.nullable(), expectedAt: Instant.nullable(), lateDays: z.int(), totalMinor: Money, currency: Currency,
  report: z.object({ id: Id, number: z.string(), issuedAt: Instant.nullable() }).nullable(), createdAt: Instant,
})
export type JobRow = z.infer<typeof JobRow>

export const TestInJob = z.object({
  id: Id, methodId: z.string(), label: z.string(), summary: z.string(), state: TestState,
  parameters: z.record(z.string(), z.unknown()), requirement: Requirement.nullable(),
  /** Set once the run is accepted. */
  mainResult: z.object({ symbol: z.string(), reported: z.string() }).nullable(),
  runId: Id.nullable(),
})
export const SampleInJob = z.object({
  id: Id, number: z.string(), heat: z.string(), lot: z.string(), material: z.string(), piece: Piece, state: SampleState,
  onHold: z.boolean(), condition: z.string(), receivedAt: Instant.nullable(), now: z.string(), traveller: Traveller, tests: z.array(TestInJob),
})
export type SampleInJob = z.infer<typeof SampleInJob>

export const Hold = z.object({
  id: Id, jobId: Id, sampleId: Id.nullable(), sampleNumber: z.string().nullable(), reason: z.string(), question: z.string(), answers: z.array(z.string()),
  answer: z.string().nullable(), placedAt: Instant, answeredAt: Instant.nullable(), releasedAt: Instant.nullable(), version: Version,
})
export type Hold = z.infer<typeof Hold>
export const Message = z.object({ id: Id, by: z.string(), mine: z.boolean(), text: z.string(), at: Instant, files: z.array(z.object({ id: Id, name: z.string() })) })
export const FileInJob = z.object({ id: Id, name: z.string(), mediaType: z.string(), size: z.int(), purpose: z.enum(['attachment', 'photo', 'record']), at: Instant, sampleId: Id.nullable() })

export const Job = z.object({
  id: Id, number: z.string(), customerId: Id, customerName: z.string(), siteId: Id, siteName: z.string(), siteAddress: z.string(), timeZone: z.string(),
  state: JobState, money: MoneyState, waitsForPayment: z.boolean(), version: Version, order: Order, netMinor: Money, taxMinor: Money, totalMinor: Money, currency: Currency,
  lines: Quote.shape.lines, placedAt: Instant.nullable(), promisedAt: Instant.nullable(), expectedAt: Instant.nullable(), lateDays: z.int(), createdAt: Instant,
  samples: z.array(SampleInJob), holds: z.array(Hold), messages: z.array(Message), files: z.array(FileInJob),
  reports: z.array(z.object({ id: Id, number: z.string(), state: ReportState, issuedAt: Instant.nullable() })), invoiceId: Id.nullable(),
  /** Why a report cannot be issued yet; empty when it can. */
  notYetReportable: z.string(),
})
export type Job = z.infer<typeof Job>

const OneJob = z.strictObject({ jobId: Id })
const Seen = z.strictObject({ version: Version })

export const listJobs = endpoint({
  method: 'get', path: '/jobs', can: ['read', 'Job'],
  query: z.strictObject({ ...PageQuery, state: JobState.optional(), search: z.string().trim().max(100).optional(), sort: z.enum(['newest', 'due']).default('newest') }),
  response: page(JobRow),
})
export const countJobs = endpoint({ method: 'get', path: '/job-counts', can: ['read', 'Job'], response: z.object({ counts: z.record(JobState, z.int()) }) })
export const readJob = endpoint({ method: 'get', path: '/jobs/:jobId', can: ['read', 'Job'], params: OneJob, response: Job })
/** Starts a draft; `from` copies an earlier job's order. */
export const draftJob = endpoint({ method: 'post', path: '/jobs', can: ['create', 'Job'], body: z.strictObject({ from: Id.optional() }), response: Job })
export const saveDraft = endpoint({ method: 'put', path: '/jobs/:jobId/order', can: ['change', 'Job'], params: OneJob, body: z.strictObject({ version: Version, order: Order }), response: Job })
export const discardDraft = endpoint({ method: 'delete', path: '/jobs/:jobId', can: ['cancel', 'Job'], params: OneJob, query: z.strictObject({ version: z.coerce.number().int().min(0) }), response: z.object({ discarded: z.literal(true) }) })
export const quoteOrder = endpoint({ method: 'post', path: '/quotes', can: ['create', 'Job'], body: z.strictObject({ order: Order }), response: Quote })
/** Opens the payment page for a draft without faults; the draft cannot change while it is open. */
export const payJob = endpoint({ method: 'post', path: '/jobs/:jobId/checkout', can: ['pay', 'Job'], params: OneJob, body: Seen, response: z.object({ url: z.string() }) })
/** Asks the payment service how it stands, for the moment when the client comes back from its page. */
export const checkPayment = endpoint({ method: 'post', path: '/jobs/:jobId/payment-check', can: ['pay', 'Job'], params: OneJob, response: Job })
/** Closes an open payment page so that the draft can change again. */
export const reopenDraft = endpoint({ method: 'post', path: '/jobs/:jobId/reopen', can: ['pay', 'Job'], params: OneJob, body: Seen, response: Job })
/** Before samples are in work; what was paid is refunded. */
export const cancelJob = endpoint({ method: 'post', path: '/jobs/:jobId/cancel', can: ['cancel', 'Job'], params: OneJob, body: z.strictObject({ version: Version, reason: Text(500) }), response: Job })
export const writeMessage = endpoint({ method: 'post', path: '/jobs/:jobId/messages', can: ['create', 'Message'], params: OneJob, body: z.strictObject({ text: Text(2000) }), response: Job })
export const answerHold = endpoint({ method: 'post', path: '/holds/:holdId/answer', can: ['answer', 'Hold'], params: z.strictObject({ holdId: Id }), body: z.strictObject({ version: Version, answer: Text(1000) }), response: Job })
export const releaseHold = endpoint({ method: 'post', path: '/holds/:holdId/release', can: ['receive', 'Hold'], params: z.strictObject({ holdId: Id }), body: z.strictObject({ version: Version, remark: OptionalText(1000) }), response: Job })
export const issueReport = endpoint({ method: 'post', path: '/jobs/:jobId/reports', can: ['issue', 'Report'], params: OneJob, body: z.strictObject({ version: Version, password: z.string().min(1).max(128) }), response: Job })

/** Labels and packing slip: a two-dimensional code as SVG for each sample. */
export const readLabels = endpoint({
  method: 'get', path: '/jobs/:jobId/labels', can: ['read', 'Job'], params: OneJob,
  response: z.object({
    jobNumber: z.string(), jobCode: z.string(), customerName: z.string(), purchaseOrder: z.string(), siteName: z.string(), siteAddress: z.string(), afterwards: z.enum(afterwardsChoices),
    labels: z.array(z.object({ number: z.string(), code: z.string(), heat: z.string(), lot: z.string(), material: z.string(), size: z.string(), tests: z.array(z.string()), traveller: Traveller })),
  }),
})

export const jobEndpoints = [listJobs, countJobs, readJob, draftJob, saveDraft, discardDraft, quoteOrder, payJob, checkPayment, reopenDraft, cancelJob, writeMessage, answerHold, releaseHold, issueReport, readLabels]
