import * as z from 'zod'
import { found } from './found.ts'

const PageLimit = z.string().regex(/^\d+$/, 'Invalid integer').transform(Number).refine((limit) => limit >= 1 && limit <= 100, 'Limit can range between 1 and 100')

export const pageQuery = {
  limit: PageLimit.default(10),
  starting_after: z.string().optional(),
  ending_before: z.string().optional(),
}

export type PageQuery = { limit: number; starting_after?: string; ending_before?: string }

/** One page of a list, newest first, as Stripe's list objects are. `records` are in the order they were made. */
export function listPage<T extends { id: string }>(records: Record<string, T>, query: PageQuery, url: string, keep: (record: T) => boolean, write: (record: T) => unknown) {
  const all = Object.values(records).filter(keep).reverse()
  const cursor = query.starting_after ?? query.ending_before
  const at = cursor === undefined ? -1 : all.indexOf(found(records, cursor, 'object', query.starting_after ? 'starting_after' : 'ending_before', 400))
  const backwards = query.ending_before !== undefined && query.starting_after === undefined
  const rest = backwards ? all.slice(0, at) : all.slice(at + 1)
  const page = backwards ? rest.slice(-query.limit) : rest.slice(0, query.limit)
  return { object: 'list', url, has_more: rest.length > page.length, data: page.map(write) }
}
