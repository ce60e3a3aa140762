import { queryOptions } from '@tanstack/react-query'
import * as api from '../../shared/api/benches.ts'
import { call } from '../lib/call.ts'

export const benchesQuery = queryOptions({ queryKey: ['Bench', 'list'], queryFn: () => call(api.listBenches, {}) })
/** The queue changes whenever the plan does, so it goes by the plan's name. */
export const queueQuery = (benchId: string) => queryOptions({ queryKey: ['PlanEntry', 'list', 'queue', benchId], queryFn: () => call(api.readQueue, { params: { benchId } }) })
export const floorQuery = (filter: { siteId?: string; days: number }) => queryOptions({ queryKey: ['PlanEntry', 'list', 'floor', filter], queryFn: () => call(api.readFloor, { query: filter }) })
export const equipmentQuery = queryOptions({ queryKey: ['Equipment', 'list'], queryFn: () => call(api.listEquipment, {}) })
