import * as z from 'zod'
import { Id } from './basics.ts'
import { endpoint } from './endpoint.ts'
import { FileInJob } from './jobs.ts'

/** Largest upload, in bytes. */
export const largestFile = 25 * 1024 * 1024

const OneFile = z.strictObject({ fileId: Id })
/** A drawing, purchase order or specification for a job. */
export const attachFile = endpoint({ method: 'post', path: '/jobs/:jobId/files', can: ['create', 'File'], params: z.strictObject({ jobId: Id }), takes: 'file', response: FileInJob })
/** A photo of a sample as it came. */
export const addPhoto = endpoint({ method: 'post', path: '/samples/:sampleId/photos', can: ['receive', 'Sample'], params: z.strictObject({ sampleId: Id }), takes: 'file', response: FileInJob })
/** The file of a measured record, kept beside the readings taken from it. */
export const addRecord = endpoint({ method: 'post', path: '/test-runs/:testRunId/records', can: ['record', 'TestRun'], params: z.strictObject({ testRunId: Id }), takes: 'file', response: FileInJob })
/** As it came, or a picture's copy for display. */
export const downloadFile = endpoint({
  method: 'get', path: '/files/:fileId', can: ['read', 'File'], params: OneFile, query: z.strictObject({ as: z.enum(['original', 'display']).default('original') }), answers: 'file',
})
/** Only while the job is a draft. */
export const removeFile = endpoint({ method: 'delete', path: '/files/:fileId', can: ['create', 'File'], params: OneFile, response: z.object({ removed: z.literal(true) }) })

export const fileEndpoints = [attachFile, addPhoto, addRecord, downloadFile, removeFile]
