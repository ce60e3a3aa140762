import type { Router } from 'express'
import * as api from '../../shared/api/evaluations.ts'
import { route } from '../http/route.ts'
import { evaluateCase } from '../services/evaluations/evaluate-case.ts'
import { readCatalogue } from '../services/evaluations/read-catalogue.ts'

export function evaluationRoutes(router: Router): void {
  route(router, api.evaluateCase, ({ body }) => Promise.resolve(evaluateCase(body)))
  route(router, api.readCatalogue, (_input, caller) => readCatalogue(caller))
}
