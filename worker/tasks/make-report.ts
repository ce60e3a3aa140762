import * as z from 'zod'
import { makeReport as make } from '../../server/services/reports/make-report.ts'
import { task } from '../task.ts'

/** Draws the file of a report that was signed. */
export const makeReport = task({
  name: 'make-report', on: ['report.ordered'], payload: z.object({ subjectId: z.uuid() }), attempts: 8,
  run: ({ subjectId }) => make(subjectId, { person: null, requestId: 'task:make-report' }),
})
