import type { Router } from 'express'
import * as api from '../../shared/api/samples.ts'
import { route } from '../http/route.ts'
import { findCode } from '../services/samples/find-code.ts'
import { finishStep } from '../services/samples/finish-step.ts'
import { listSamples } from '../services/samples/list-samples.ts'
import { receiveSample } from '../services/samples/receive-sample.ts'
import { reportMissing } from '../services/samples/report-missing.ts'
import { sampleView } from '../services/samples/sample-view.ts'
import { startStep } from '../services/samples/start-step.ts'

export function sampleRoutes(router: Router): void {
  route(router, api.listSamples, ({ query }, caller) => listSamples(query, caller))
  route(router, api.readSample, ({ params }, caller) => sampleView(params.sampleId, caller))
  route(router, api.findCode, ({ params }, caller) => findCode(params.code, caller))
  route(router, api.receiveSample, ({ params, body }, caller) => receiveSample(params.sampleId, body, caller))
  route(router, api.reportMissing, ({ params, body }, caller) => reportMissing(params.sampleId, body, caller))
  route(router, api.startStep, ({ params, body }, caller) => startStep(params.stepId, body.benchId, caller))
  route(router, api.finishStep, ({ params, body }, caller) => finishStep(params.stepId, body, caller))
}
