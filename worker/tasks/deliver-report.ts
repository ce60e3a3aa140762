import * as z from 'zod'
import { deliverReport as deliver } from '../../server/services/reports/deliver-report.ts'
import { task } from '../task.ts'

/** Mails a report to its customer as soon as its file is there. Tried for long: a mail server may be away for hours. */
export const deliverReport = task({
  name: 'deliver-report', on: ['report.issued'], payload: z.object({ subjectId: z.uuid() }), attempts: 12,
  run: ({ subjectId }) => deliver(subjectId, { person: null, requestId: 'task:deliver-report' }),
})
