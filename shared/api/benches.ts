import * as z from 'zod'
import { Day, Id, Instant, Traveller } from './basics.ts'
import { endpoint } from './endpoint.ts'

export const EquipmentState = z.object({
  id: Id, code: z.string(), name: z.string(), kind: z.string(), siteId: Id, siteName: z.string(), calibratedUntil: Day.nullable(), certificate: z.string(), outOfUse: z.boolean(),
  lastVerification: z.object({ at: Instant, passed: z.boolean(), text: z.string() }).nullable(),
})
export type EquipmentState = z.infer<typeof EquipmentState>

export const Bench = z.object({
  id: Id, siteId: Id, siteName: z.string(), name: z.string(), code: z.string(), units: z.int(), out: z.boolean(),
  does: z.array(z.object({ kind: z.string(), /** The method's title, or the kind of preparation: a list of benches needs no method's code for it. */ label: z.string(), limits: z.record(z.string(), z.tuple([z.number(), z.number()])) })), equipment: EquipmentState.nullable(),
})
export type Bench = z.infer<typeof Bench>

/** One line of the technician's queue: a step of a sample, planned at this bench. */
export const QueueItem = z.object({
  stepId: Id, sampleId: Id, sampleNumber: z.string(), jobId: Id, testId: Id.nullable(), runId: Id.nullable(), methodId: z.string().nullable(),
  label: z.string(), material: z.string(), plannedStart: Instant.nullable(), plannedEnd: Instant.nullable(), state: z.enum(['planned', 'started']),
  isHere: z.boolean(), onHold: z.boolean(), lateDays: z.int(), note: z.string(), traveller: Traveller,
})
export type QueueItem = z.infer<typeof QueueItem>
export const Queue = z.object({ bench: Bench, items: z.array(QueueItem), doneToday: z.int(), lastDoneAt: Instant.nullable(), timeZone: z.string() })
export type Queue = z.infer<typeof Queue>

export const FloorStrip = z.object({
  benchId: Id, stepIds: z.array(Id), jobId: Id, jobNumber: z.string(), label: z.string(), start: Instant, end: Instant, state: z.enum(['planned', 'started', 'done']),
  stage: z.enum(['placed', 'awaiting samples', 'in work']), sampleNumbers: z.array(z.string()), person: z.string().nullable(), why: z.string(),
  rejected: z.array(z.object({ bench: z.string(), because: z.string() })),
})
export type FloorStrip = z.infer<typeof FloorStrip>
export const Floor = z.object({
  madeAt: Instant.nullable(), from: Instant, to: Instant, days: z.array(z.object({ day: Day })),
  sites: z.array(z.object({
    id: Id, name: z.string(), timeZone: z.string(),
    benches: z.array(z.object({ id: Id, name: z.string(), code: z.string(), out: z.boolean(), open: z.array(z.object({ start: Instant, end: Instant })), openMinutes: z.int(), heldMinutes: z.int() })),
  })),
  strips: z.array(FloorStrip),
  unplaced: z.array(z.object({ stepId: Id, jobId: Id, jobNumber: z.string(), sampleNumber: z.string(), label: z.string(), because: z.string(), cures: z.array(z.string()) })),
})
export type Floor = z.infer<typeof Floor>

export const listBenches = endpoint({ method: 'get', path: '/benches', can: ['read', 'Bench'], response: z.object({ items: z.array(Bench) }) })
export const readQueue = endpoint({ method: 'get', path: '/benches/:benchId/queue', can: ['read', 'Bench'], params: z.strictObject({ benchId: Id }), response: Queue })
export const readFloor = endpoint({ method: 'get', path: '/floor', can: ['manage', 'PlanEntry'], query: z.strictObject({ siteId: Id.optional(), days: z.coerce.number().int().min(1).max(14).default(5) }), response: Floor })
export const listEquipment = endpoint({ method: 'get', path: '/equipment', can: ['read', 'Equipment'], response: z.object({ items: z.array(EquipmentState) }) })

export const benchEndpoints = [listBenches, readQueue, readFloor, listEquipment]
