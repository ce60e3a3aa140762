import * as z from 'zod'
import { Piece } from '../method/piece.ts'
import { Day, Id, Instant, OptionalText, Text, Traveller, Version } from './basics.ts'
import { EquipmentState } from './benches.ts'
import { endpoint } from './endpoint.ts'
import { Evaluation } from './evaluations.ts'
import { Requirement } from './orders.ts'
import { RunState } from './words.ts'

/** One thing kept at the bench: a row of a set, a named reading, or a measured parameter. Never edited, only struck out. */
export const Reading = z.object({
  id: Id, key: z.string(), path: z.string(), value: z.unknown(), at: Instant, by: z.string(),
  struck: z.object({ reason: z.string(), at: Instant, by: z.string() }).nullable(),
})
export type Reading = z.infer<typeof Reading>

export const Review = z.object({
  id: Id, outcome: z.enum(['accepted', 'sent back']), remark: z.string(), readings: z.array(Id), at: Instant, by: z.string(),
})

export const TestRun = z.object({
  id: Id, testId: Id, sampleId: Id, jobId: Id, number: z.int(), state: RunState, version: Version, methodId: z.string(), methodVersion: z.int(),
  siteId: Id, siteName: z.string(), timeZone: z.string(), benchId: Id, benchName: z.string(), equipment: EquipmentState.nullable(),
  performedById: Id, performedBy: z.string(), startedAt: Instant, recordedAt: Instant.nullable(),
  sampleNumber: z.string(), heat: z.string(), lot: z.string(), material: z.string(), piece: Piece, purchaseOrder: z.string(), customerName: z.string(), neededBy: Day.nullable(),
  traveller: Traveller, parameters: z.record(z.string(), z.unknown()), requirement: Requirement.nullable(), readings: z.array(Reading),
  /** Set when the run is recorded; while it is open the browser works it out from the readings. */
  evaluation: Evaluation.nullable(), remark: z.string(), reviews: z.array(Review),
  /** Why I may not review it; empty when I may. */
  notMineToReview: z.string(),
  /** The last day of my own right to review it; null when I have none. */
  mayReviewUntil: Day.nullable(),
  /** The last day of the right to carry it out, of the person who ran it. */
  authorisedUntil: Day.nullable(),
  /** What other tests of the same sample gave, recorded or accepted, to hold this one against. */
  sameSample: z.array(z.object({ label: z.string(), symbol: z.string(), reported: z.string(), value: z.number(), key: z.string() })),
})
export type TestRun = z.infer<typeof TestRun>

const OneRun = z.strictObject({ testRunId: Id })

/** Opens a run of a test at a bench, or gives the open one back. */
export const startRun = endpoint({ method: 'post', path: '/tests/:testId/runs', can: ['record', 'TestRun'], params: z.strictObject({ testId: Id }), body: z.strictObject({ benchId: Id }), response: TestRun })
export const readRun = endpoint({ method: 'get', path: '/test-runs/:testRunId', can: ['read', 'TestRun'], params: OneRun, response: TestRun })

/** Each kept reading has a key made by the browser, so that sending it twice keeps it once. */
export const SaveReadings = z.strictObject({
  version: Version,
  keep: z.array(z.strictObject({ key: z.string().regex(/^[A-Za-z0-9-]{8,64}$/), path: z.string().max(80), value: z.json() })).max(500),
  strike: z.array(z.strictObject({ key: z.string().regex(/^[A-Za-z0-9-]{8,64}$/), reason: Text(300) })).max(500),
})
export type SaveReadings = z.infer<typeof SaveReadings>
export const saveReadings = endpoint({ method: 'put', path: '/test-runs/:testRunId/readings', can: ['record', 'TestRun'], params: OneRun, body: SaveReadings, response: TestRun })
/** Hands the run over for review; refused while a rule of severity `error` is broken. */
export const recordRun = endpoint({ method: 'post', path: '/test-runs/:testRunId/record', can: ['record', 'TestRun'], params: OneRun, body: z.strictObject({ version: Version, remark: OptionalText(1000) }), response: TestRun })
export const stopRun = endpoint({ method: 'post', path: '/test-runs/:testRunId/stop', can: ['record', 'TestRun'], params: OneRun, body: z.strictObject({ version: Version, reason: Text(500) }), response: TestRun })
export const reviewRun = endpoint({
  method: 'post', path: '/test-runs/:testRunId/review', can: ['review', 'TestRun'], params: OneRun,
  body: z.strictObject({ version: Version, outcome: z.enum(['accepted', 'sent back']), remark: OptionalText(1000), readings: z.array(Id).max(500).default([]) })
    .refine(({ outcome, remark }) => outcome === 'accepted' || remark.length > 0, { path: ['remark'], message: 'say what has to be done again, and why' }),
  response: TestRun,
})

export const ReviewItem = z.object({
  testRunId: Id, sampleNumber: z.string(), label: z.string(), performedBy: z.string(), isOwn: z.boolean(), neededBy: Day.nullable(), recordedAt: Instant,
  unusual: z.int(), traveller: Traveller, jobId: Id, customerName: z.string(),
})
export type ReviewItem = z.infer<typeof ReviewItem>
export const listReviews = endpoint({ method: 'get', path: '/reviews', can: ['review', 'TestRun'], response: z.object({ items: z.array(ReviewItem) }) })

export const testRunEndpoints = [startRun, readRun, saveReadings, recordRun, stopRun, reviewRun, listReviews]
