import type { Router } from 'express'
import * as api from '../../shared/api/test-runs.ts'
import { route } from '../http/route.ts'
import { listReviews } from '../services/test-runs/list-reviews.ts'
import { readRun } from '../services/test-runs/read-run.ts'
import { recordRun } from '../services/test-runs/record-run.ts'
import { reviewRun } from '../services/test-runs/review-run.ts'
import { saveReadings } from '../services/test-runs/save-readings.ts'
import { startRun } from '../services/test-runs/start-run.ts'
import { stopRun } from '../services/test-runs/stop-run.ts'

export function testRunRoutes(router: Router): void {
  route(router, api.startRun, ({ params, body }, caller) => startRun(params.testId, body.benchId, caller))
  route(router, api.readRun, ({ params }, caller) => readRun(params.testRunId, caller))
  route(router, api.saveReadings, ({ params, body }, caller) => saveReadings(params.testRunId, body, caller))
  route(router, api.recordRun, ({ params, body }, caller) => recordRun(params.testRunId, body, caller))
  route(router, api.stopRun, ({ params, body }, caller) => stopRun(params.testRunId, body, caller))
  route(router, api.reviewRun, ({ params, body }, caller) => reviewRun(params.testRunId, body, caller))
  route(router, api.listReviews, (_input, caller) => listReviews(caller))
}
