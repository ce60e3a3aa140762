import type { Router } from 'express'
import * as api from '../../shared/api/benches.ts'
import { route } from '../http/route.ts'
import { listBenches } from '../services/benches/list-benches.ts'
import { readQueue } from '../services/benches/read-queue.ts'
import { listEquipment } from '../services/equipment/list-equipment.ts'
import { readFloor } from '../services/planning/read-floor.ts'

export function benchRoutes(router: Router): void {
  route(router, api.listBenches, (_input, caller) => listBenches(caller))
  route(router, api.readQueue, ({ params }, caller) => readQueue(params.benchId, caller))
  route(router, api.readFloor, ({ query }, caller) => readFloor(query, caller))
  route(router, api.listEquipment, (_input, caller) => listEquipment(caller))
}
