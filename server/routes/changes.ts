import type { Router } from 'express'
import { listEvents as listEventsEndpoint, readChanges } from '../../shared/api/changes.ts'
import type { ChangesHub } from '../http/changes-hub.ts'
import { route } from '../http/route.ts'
import { listEvents } from '../services/ledger/list-events.ts'

export function changeRoutes(router: Router, hub: ChangesHub): void {
  route(router, readChanges, async (_input, caller, { req, res }) => {
    const lastSeen = Number(req.get('last-event-id'))
    await hub.open(caller, res, Number.isSafeInteger(lastSeen) && lastSeen > 0 ? lastSeen : null)
    return undefined
  })
  route(router, listEventsEndpoint, ({ params, query }, caller) => listEvents(params.jobId, query, caller))
}
