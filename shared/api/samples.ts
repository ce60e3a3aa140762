import * as z from 'zod'
import { Id, Instant, OptionalText, page, PageById, Text, Version } from './basics.ts'
import { endpoint } from './endpoint.ts'
import { FileInJob, Hold, SampleInJob } from './jobs.ts'

/** A sample as a row of a list or a scan's answer. */
export const SampleRow = SampleInJob.omit({ tests: true, traveller: true }).extend({
  jobId: Id, jobNumber: z.string(), customerName: z.string(), siteName: z.string(), tests: z.string(), version: Version,
})
export type SampleRow = z.infer<typeof SampleRow>

/** One step of the traveller with its plan and its why. */
export const StepInSample = z.object({
  id: Id, position: z.int(), label: z.string(), kind: z.string(), capability: z.string(), testId: Id.nullable(), state: z.enum(['to come', 'planned', 'started', 'done', 'void']),
  benchId: Id.nullable(), benchName: z.string().nullable(), personName: z.string().nullable(), plannedStart: Instant.nullable(), plannedEnd: Instant.nullable(),
  startedAt: Instant.nullable(), endedAt: Instant.nullable(), why: z.string(), rejected: z.array(z.object({ bench: z.string(), because: z.string() })), unplacedBecause: z.string().nullable(),
})
export type StepInSample = z.infer<typeof StepInSample>

export const Sample = SampleInJob.extend({
  jobId: Id, jobNumber: z.string(), customerName: z.string(), siteName: z.string(), timeZone: z.string(), purchaseOrder: z.string(), version: Version,
  steps: z.array(StepInSample), holds: z.array(Hold), photos: z.array(FileInJob),
  /** What the person at the bench should do next, if anything. */
  next: z.object({ stepId: Id, label: z.string(), testId: Id.nullable(), benchId: Id.nullable() }).nullable(),
})
export type Sample = z.infer<typeof Sample>

const OneSample = z.strictObject({ sampleId: Id })

export const listSamples = endpoint({
  method: 'get', path: '/samples', can: ['read', 'Sample'],
  query: z.strictObject({ ...PageById, search: z.string().trim().max(100).optional(), state: z.enum(['expected', 'received', 'in work', 'done', 'missing', 'void']).optional(), jobId: Id.optional() }),
  response: page(SampleRow),
})
export const readSample = endpoint({ method: 'get', path: '/samples/:sampleId', can: ['read', 'Sample'], params: OneSample, response: Sample })
/** What a scanned code or a typed number stands for. */
export const findCode = endpoint({
  method: 'get', path: '/codes/:code', can: 'signed-in', params: z.strictObject({ code: z.string().trim().min(3).max(80) }),
  response: z.object({ subject: z.enum(['Sample', 'Job', 'Report']), id: Id, number: z.string() }),
})
/** Takes a sample in. A mismatch puts it on hold with a question to the customer. */
export const receiveSample = endpoint({
  method: 'post', path: '/samples/:sampleId/receive', can: ['receive', 'Sample'], params: OneSample,
  body: z.strictObject({ version: Version, condition: Text(300), mismatch: z.strictObject({ reason: Text(300), question: Text(500), answers: z.array(Text(120)).max(4) }).nullable() }),
  response: Sample,
})
/** A sample that did not come with its parcel. */
export const reportMissing = endpoint({ method: 'post', path: '/samples/:sampleId/missing', can: ['receive', 'Sample'], params: OneSample, body: z.strictObject({ version: Version, remark: OptionalText(500) }), response: Sample })
export const startStep = endpoint({ method: 'post', path: '/steps/:stepId/start', can: ['prepare', 'Step'], params: z.strictObject({ stepId: Id }), body: z.strictObject({ benchId: Id }), response: Sample })
export const finishStep = endpoint({ method: 'post', path: '/steps/:stepId/finish', can: ['prepare', 'Step'], params: z.strictObject({ stepId: Id }), body: z.strictObject({ remark: OptionalText(500) }), response: Sample })

export const sampleEndpoints = [listSamples, readSample, findCode, receiveSample, reportMissing, startStep, finishStep]
