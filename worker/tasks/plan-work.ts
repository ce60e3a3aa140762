import * as z from 'zod'
import { planSite } from '../../server/services/planning/plan-site.ts'
import { task } from '../task.ts'

/** Plans a site again after anything that changes what is to do there. A plan that already knows of the event is left as it is. */
export const planWork = task({
  name: 'plan-work',
  on: ['job.placed', 'job.cancelled', 'sample.received', 'sample.missing', 'hold.placed', 'hold.released', 'step.started', 'step.finished', 'test-run.started', 'test-run.recorded', 'test-run.stopped', 'test-run.sent-back'],
  payload: z.object({ siteId: z.uuid(), eventId: z.int() }),
  attempts: 8,
  async run({ siteId, eventId }) {
    await planSite(siteId, { knownEvent: eventId }, { person: null, requestId: `task:plan-work:${eventId}` })
  },
})
