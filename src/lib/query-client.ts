import { QueryClient } from '@tanstack/react-query'
import { Refusal } from './refusal.ts'

/** Queries are kept fresh by events, so they do not go stale by themselves; a refusal is not asked twice. */
export function createQueryClient(): QueryClient {
  return new QueryClient({
    defaultOptions: {
      queries: {
        staleTime: 60_000,
        retry: (times, error) => times < 2 && error instanceof Refusal && (error.code === 'unreachable' || error.code === 'unavailable'),
      },
      mutations: { retry: false },
    },
  })
}
