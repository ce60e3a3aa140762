import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { endOfDay, instantOf, minuteOf, openIntervals, withTimes, workingDaysOn } from '../../../server/services/planning/plan-clock.ts'
import { usualHours, type WeekHours } from '../../../shared/planning/bench-hours.ts'

const minute = (iso: string) => Date.parse(iso) / 60_000
const said = (intervals: [number, number][]) => intervals.map((pair) => pair.map((one) => instantOf(one).toISOString().slice(0, 16)))
const open = (hours: WeekHours, zone: string, from: string, to: string) => said(openIntervals(hours, zone, minute(from), minute(to)))

describe('opening hours across a change of the clock', () => {
  it('in spring begin an hour earlier by the sun: Europe/London, 29 March 2026', () => {
    // Friday 27 March is still GMT, Monday 30 March is BST (UTC+1)
    expect(open(usualHours, 'Europe/London', '2026-03-27T00:00Z', '2026-03-31T00:00Z')).toEqual([['2026-03-27T07:30', '2026-03-27T17:00'], ['2026-03-30T06:30', '2026-03-30T16:00']])
  })
  it('in autumn begin an hour later by the sun: Europe/London, 25 October 2026', () => {
    expect(open(usualHours, 'Europe/London', '2026-10-23T00:00Z', '2026-10-27T00:00Z')).toEqual([['2026-10-23T06:30', '2026-10-23T16:00'], ['2026-10-26T07:30', '2026-10-26T17:00']])
  })
  it('of the night itself are an hour short in spring and an hour long in autumn', () => {
    const sunday: WeekHours = [{ weekday: 7, from: '00:00', to: '06:00' }]
    const length = (from: string, to: string) => openIntervals(sunday, 'Europe/London', minute(from), minute(to)).map(([start, end]) => end - start)
    expect(length('2026-03-28T12:00Z', '2026-03-29T12:00Z')).toEqual([5 * 60])
    expect(length('2026-10-24T12:00Z', '2026-10-25T12:00Z')).toEqual([7 * 60])
    expect(length('2026-06-06T12:00Z', '2026-06-07T12:00Z')).toEqual([6 * 60])
  })
  it('that fall in the hour that does not exist are still an interval or none, never a reversed one', () => {
    const gap: WeekHours = [{ weekday: 7, from: '01:15', to: '01:45' }, { weekday: 7, from: '01:30', to: '03:00' }]
    for (const [start, end] of openIntervals(gap, 'Europe/London', minute('2026-03-28T12:00Z'), minute('2026-03-29T12:00Z'))) expect(start).toBeLessThan(end)
  })
})

describe('opening hours', () => {
  it('are cut at both ends', () => {
    expect(open(usualHours, 'Europe/London', '2026-01-05T12:00Z', '2026-01-06T08:00Z')).toEqual([['2026-01-05T12:00', '2026-01-05T17:00'], ['2026-01-06T07:30', '2026-01-06T08:00']])
    expect(open(usualHours, 'Europe/London', '2026-01-05T17:00Z', '2026-01-06T07:30Z')).toEqual([])
  })
  it('of one day that touch or overlap are one, whatever their order', () => {
    const hours: WeekHours = [{ weekday: 1, from: '13:00', to: '17:00' }, { weekday: 1, from: '08:00', to: '12:00' }, { weekday: 1, from: '12:00', to: '12:30' }, { weekday: 1, from: '09:00', to: '10:00' }]
    expect(open(hours, 'UTC', '2026-01-05T00:00Z', '2026-01-06T00:00Z')).toEqual([['2026-01-05T08:00', '2026-01-05T12:30'], ['2026-01-05T13:00', '2026-01-05T17:00']])
  })
  it('that end before they begin are none', () => {
    expect(open([{ weekday: 1, from: '17:00', to: '08:00' }], 'UTC', '2026-01-05T00:00Z', '2026-01-07T00:00Z')).toEqual([])
  })
  it('are always in order, apart, and inside what was asked for', () => {
    const clock = fc.tuple(fc.integer({ min: 0, max: 23 }), fc.integer({ min: 0, max: 59 })).map(([hour, min]) => `${String(hour).padStart(2, '0')}:${String(min).padStart(2, '0')}`)
    const hours = fc.array(fc.record({ weekday: fc.integer({ min: 1, max: 7 }), from: clock, to: clock }), { maxLength: 10 })
    const zone = fc.constantFrom('Europe/London', 'America/New_York', 'Australia/Lord_Howe', 'Asia/Kathmandu', 'America/Santiago', 'UTC')
    fc.assert(fc.property(hours, zone, fc.integer({ min: minute('2026-01-01T00:00Z'), max: minute('2026-12-31T00:00Z') }), fc.integer({ min: 0, max: 40_000 }), (week, where, from, length) => {
      let last = -Infinity
      for (const [start, end] of openIntervals(week, where, from, from + length)) {
        expect(start).toBeGreaterThan(last)
        expect(end).toBeGreaterThan(start)
        expect(start).toBeGreaterThanOrEqual(from)
        expect(end).toBeLessThanOrEqual(from + length)
        last = end
      }
    }), { numRuns: 60 })
  })
})

describe('days', () => {
  it('end at their last minute where the clock hangs', () => {
    expect(instantOf(endOfDay('2026-07-01', 'Europe/London')).toISOString()).toBe('2026-07-01T22:59:00.000Z')
    expect(instantOf(endOfDay('2026-10-25', 'Europe/London')).toISOString()).toBe('2026-10-25T23:59:00.000Z')
  })
  it('of work leave out the weekend and keep the hour across a change of the clock', () => {
    expect(workingDaysOn(new Date('2026-03-27T15:00Z'), 1, 10, usualHours, 'Europe/London').toISOString()).toBe('2026-03-30T09:00:00.000Z')
    expect(workingDaysOn(new Date('2026-10-23T15:00Z'), 2, 17, usualHours, 'Europe/London').toISOString()).toBe('2026-10-27T17:00:00.000Z')
    expect(workingDaysOn(new Date('2026-10-24T15:00Z'), 3, 17, [], 'Europe/London').toISOString()).toBe('2026-10-27T17:00:00.000Z')
  })
  it('a moment within a minute counts as the next one', () => {
    expect(instantOf(minuteOf(new Date('2026-01-05T10:00:00.001Z'))).toISOString()).toBe('2026-01-05T10:01:00.000Z')
    expect(minuteOf(instantOf(29_000_000))).toBe(29_000_000)
  })
})

it('the planner\'s minutes become times that people read', () => {
  const at = minute('2026-07-07T09:30Z')
  expect(withTimes(`free from minute ${at}`, 'Europe/London')).toBe('free from Tue 7 Jul, 10:30')
  expect(withTimes('ends 45 min later', 'UTC')).toBe('ends 45 min later')
  expect(withTimes('ends 300 min later', 'UTC')).toBe('ends 5 h later')
})
