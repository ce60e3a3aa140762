import type { Router } from 'express'
import * as api from '../../shared/api/jobs.ts'
import { route } from '../http/route.ts'
import { cancelJob } from '../services/jobs/cancel-job.ts'
import { countJobs } from '../services/jobs/count-jobs.ts'
import { discardDraft } from '../services/jobs/discard-draft.ts'
import { draftJob } from '../services/jobs/draft-job.ts'
import { listJobs } from '../services/jobs/list-jobs.ts'
import { quoteOrder } from '../services/jobs/quote-order.ts'
import { readJob } from '../services/jobs/read-job.ts'
import { readLabels } from '../services/jobs/read-labels.ts'
import { saveDraft } from '../services/jobs/save-draft.ts'
import { answerHold } from '../services/jobs/talk/answer-hold.ts'
import { releaseHold } from '../services/jobs/talk/release-hold.ts'
import { writeMessage } from '../services/jobs/talk/write-message.ts'

export function jobRoutes(router: Router): void {
  route(router, api.listJobs, ({ query }, caller) => listJobs(query, caller))
  route(router, api.countJobs, (_input, caller) => countJobs(caller))
  route(router, api.readJob, ({ params }, caller) => readJob(params.jobId, caller))
  route(router, api.draftJob, ({ body }, caller) => draftJob(body, caller))
  route(router, api.saveDraft, ({ params, body }, caller) => saveDraft(params.jobId, body, caller))
  route(router, api.discardDraft, ({ params, query }, caller) => discardDraft(params.jobId, query.version, caller))
  route(router, api.quoteOrder, ({ body }, caller) => quoteOrder(body.order, caller))
  route(router, api.cancelJob, ({ params, body }, caller) => cancelJob(params.jobId, body, caller))
  route(router, api.writeMessage, ({ params, body }, caller) => writeMessage(params.jobId, body.text, caller))
  route(router, api.answerHold, ({ params, body }, caller) => answerHold(params.holdId, body, caller))
  route(router, api.releaseHold, ({ params, body }, caller) => releaseHold(params.holdId, body, caller))
  route(router, api.readLabels, ({ params }, caller) => readLabels(params.jobId, caller))
}
