import type * as z from 'zod'
import type { FileInJob } from '../../../shared/api/jobs.ts'
import type { File } from '../../models/jobs/file.ts'

/** A file as people see it: never where or under which name it is stored. */
export function fileView({ id, name, mediaType, size, purpose, createdAt, sampleId }: File): z.infer<typeof FileInJob> {
  if (purpose === 'report') throw new Error('a report is no file of its job; it is downloaded as a report')
  return { id, name, mediaType, size, purpose, at: createdAt.toISOString(), sampleId }
}
