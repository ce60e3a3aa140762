import { describe, expect, it } from 'vitest'
import { dueWords } from '../../../src/components/jobs/list/due-words.ts'

const zone = 'Europe/London'
const job = { state: 'in work' as const, neededBy: '2026-03-13', expectedAt: '2026-03-11T16:00:00Z', lateDays: 0, report: null }

describe('when a job is due, in words', () => {
  it('counts the days in hand', () => expect(dueWords(job, zone)).toEqual({ day: '2026-03-13', under: 'on time, 2 days in hand', late: false }))
  it('says how late it will be, and until when', () => {
    const words = dueWords({ ...job, expectedAt: '2026-03-14T16:00:00Z', lateDays: 1 }, zone)
    expect(words.late).toBe(true)
    expect(words.under).toMatch(/^1 day late: /)
  })
  it('takes the day of the site, not of Greenwich', () => expect(dueWords({ ...job, neededBy: null, expectedAt: '2026-07-01T23:30:00Z' }, zone).day).toBe('2026-07-02'))
  it('has no day once it is cancelled', () => expect(dueWords({ ...job, state: 'cancelled' }, zone)).toEqual({ day: null, under: 'cancelled', late: false }))
  it('says when it was reported, also when that was late', () => {
    const report = { id: '01a23210-0000-7000-8000-000000000001', number: 'R-26-00001/1', issuedAt: '2026-03-16T10:00:00Z' }
    expect(dueWords({ ...job, state: 'reported', lateDays: 3, report }, zone).under).toMatch(/^reported /)
  })
})
