import { cleanup, render, screen } from '@testing-library/react'
import userEvent from '@testing-library/user-event'
import { afterEach, describe, expect, it, vi } from 'vitest'
import { Problem } from '../../../shared/problems.ts'
import { QueryState, type QueryLike } from '../../../src/components/ui/query-state.tsx'

const query = (more: Partial<QueryLike<string[]>>): QueryLike<string[]> => ({ data: undefined, error: null, isPending: false, isFetching: false, refetch: () => undefined, ...more })
const draw = (more: Partial<QueryLike<string[]>>) =>
  render(<QueryState what="the jobs" query={query(more)} empty={{ when: (jobs) => jobs.length === 0, title: 'No jobs yet' }}>{(jobs) => <p>{jobs.join()}</p>}</QueryState>)

afterEach(cleanup)

describe('the state of a query', () => {
  it('says what is going on, what is empty, and shows what is there', () => {
    draw({ isPending: true })
    expect(screen.getByRole('status').textContent).toContain('Loading the jobs')
    cleanup()
    draw({ data: [] })
    expect(screen.getByText('No jobs yet')).toBeTruthy()
    cleanup()
    draw({ data: ['J-26-00417'] })
    expect(screen.getByText('J-26-00417')).toBeTruthy()
  })

  it('tells refused, not found and failed apart', async () => {
    draw({ error: new Problem('not-allowed', 'Ask the manager of Ollerby') })
    expect(screen.getByRole('alert').textContent).toBe('Not yours to openAsk the manager of Ollerby.')
    cleanup()
    draw({ error: new Problem('not-found', 'no such job') })
    expect(screen.getByRole('alert').textContent).toContain('The jobs: not found')
    expect(screen.queryByRole('button')).toBeNull()
    cleanup()
    const refetch = vi.fn()
    draw({ error: Object.assign(new Problem('unavailable', 'No answer in 10 s'), { requestId: '7f3c-21' }), refetch })
    expect(screen.getByRole('alert').textContent).toContain('Request 7f3c-21')
    await userEvent.click(screen.getByRole('button', { name: 'Try again' }))
    expect(refetch).toHaveBeenCalledOnce()
  })

  it('keeps what is there when fetching it again fails', () => {
    draw({ data: ['J-26-00417'], error: new Problem('unavailable', 'No answer') })
    expect(screen.getByText('J-26-00417')).toBeTruthy()
    expect(screen.getByRole('status').textContent).toContain('Not up to date.')
  })
})
