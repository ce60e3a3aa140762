import * as z from 'zod'
import { Id, Instant, page, PageQuery } from './basics.ts'
import { endpoint } from './endpoint.ts'
import { subjectNames } from './permission.ts'

/** What an open screen is told: this changed, fetch it again. */
export const Change = z.object({ subject: z.enum(subjectNames), id: Id })
export type Change = z.infer<typeof Change>

/** Server-sent events; each carries the ledger's number so that a lost connection misses nothing. */
export const readChanges = endpoint({ method: 'get', path: '/changes', can: 'signed-in', answers: 'stream' })

/** The ledger of one job, for its lab. */
export const EventRow = z.object({ id: z.string(), type: z.string(), at: Instant, by: z.string().nullable(), text: z.string() })
export const listEvents = endpoint({ method: 'get', path: '/jobs/:jobId/events', can: ['read', 'Event'], params: z.strictObject({ jobId: Id }), query: z.strictObject(PageQuery), response: page(EventRow) })

export const changeEndpoints = [readChanges, listEvents]
