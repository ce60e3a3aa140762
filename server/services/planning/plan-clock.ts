import { DateTime } from 'luxon'
import type { WeekHours } from '../../../shared/planning/bench-hours.ts'

const perMinute = 60_000

/** Whole minutes since 1970, the planner's common origin. A start is rounded up, so that nothing begins before its time. */
export const minuteOf = (instant: Date) => Math.ceil(instant.getTime() / perMinute)
export const instantOf = (minute: number) => new Date(minute * perMinute)

/** The last minute of a calendar day at a place. */
export function endOfDay(day: string, timeZone: string): number {
  return Math.floor(DateTime.fromISO(day, { zone: timeZone }).endOf('day').toMillis() / perMinute)
}

/** Weekly hours as intervals from one minute to another, in order and joined where they touch, across changes of the clock. */
export function openIntervals(hours: WeekHours, timeZone: string, from: number, to: number): [number, number][] {
  const found: [number, number][] = []
  const last = DateTime.fromMillis(to * perMinute, { zone: timeZone })
  for (let day = DateTime.fromMillis(from * perMinute, { zone: timeZone }).startOf('day'); day <= last; day = day.plus({ days: 1 })) {
    const today = hours.filter(({ weekday }) => weekday === day.weekday).map((one): [number, number] => [Math.max(at(day, one.from), from), Math.min(at(day, one.to), to)])
    for (const [start, end] of today.filter(([start, end]) => start < end).sort((a, b) => a[0] - b[0])) {
      const before = found.at(-1)
      if (before && start <= before[1]) before[1] = Math.max(before[1], end)
      else found.push([start, end])
    }
  }
  return found
}

function at(day: DateTime, clock: string): number {
  const [hour, minute] = clock.split(':').map(Number)
  return Math.ceil(day.set({ hour: hour!, minute: minute! }).toMillis() / perMinute)
}

/** A number of working days on, at an hour of the day, by the site's own hours and time. */
export function workingDaysOn(from: Date, days: number, hour: number, hours: WeekHours, timeZone: string): Date {
  const works = new Set(hours.map(({ weekday }) => weekday))
  let day = DateTime.fromJSDate(from, { zone: timeZone }).startOf('day')
  if (works.size === 0) return day.plus({ days }).set({ hour }).toJSDate()
  for (let left = days; left > 0;) {
    day = day.plus({ days: 1 })
    if (works.has(day.weekday)) left -= 1
  }
  return day.set({ hour }).toJSDate()
}

/** The planner's sentences with times that people read: "minute 29640" becomes "Tue 10 Mar, 10:30" at the site. */
export function withTimes(sentence: string, timeZone: string): string {
  return sentence
    .replace(/minute (\d{5,})/g, (_, minute: string) => DateTime.fromMillis(Number(minute) * perMinute, { zone: timeZone }).toFormat('ccc d LLL, HH:mm'))
    .replace(/(\d+) min later/g, (whole, minutes: string) => (Number(minutes) < 120 ? whole : `${Math.round(Number(minutes) / 60)} h later`))
}
