import type { Change } from '../../../shared/api/changes.ts'

/** Whose open screens show a step of a sample: the sample, its job, and the queues and floor that list the step. */
export function touchesOf({ jobId, sampleId }: { jobId: string; sampleId: string }, stepId?: string): Change[] {
  return [{ subject: 'Job', id: jobId }, { subject: 'Sample', id: sampleId }, ...(stepId ? [{ subject: 'PlanEntry', id: stepId } as const] : [])]
}
