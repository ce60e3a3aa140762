import { queryOptions } from '@tanstack/react-query'
import { readCatalogue } from '../../shared/api/evaluations.ts'
import { call } from '../lib/call.ts'

/** What the lab offers: methods with prices and the sites that carry them out. */
export const catalogueQuery = queryOptions({ queryKey: ['MethodOffer', 'list'], queryFn: () => call(readCatalogue, {}), staleTime: 10 * 60_000 })
