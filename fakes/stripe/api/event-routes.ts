import { Router } from 'express'
import * as z from 'zod'
import type { EventRecord } from '../stripe-state.ts'
import type { ApiContext } from './api-context.ts'
import { found } from './found.ts'
import { listPage, pageQuery } from './list-page.ts'
import { parseForm } from './parse-form.ts'

const ListQuery = z.strictObject({ ...pageQuery, type: z.string().optional() })

/** `/v1/events` */
export function eventRoutes({ state }: ApiContext): Router {
  const router = Router()
  const write = (event: EventRecord): unknown => JSON.parse(event.body)

  router.get('/', (req, res) => {
    const query = parseForm(ListQuery, req.query)
    res.json(listPage(state.events, query, '/v1/events', (event) => !query.type || event.type === query.type, write))
  })
  router.get('/:id', (req, res) => {
    res.json(write(found(state.events, req.params.id, 'event')))
  })
  return router
}
