import type { Floor, FloorStrip } from '../../../shared/api/benches.ts'
import { calendarDay } from '../../lib/format.ts'

/** The hours that every day column shows, in minutes from midnight at the site. */
export type DayScale = { from: number; to: number }
/** A stretch of one day, in percent of its column. */
export type Stretch = { left: number; width: number }

const clocks = new Map<string, Intl.DateTimeFormat>()

/** Minutes since midnight on the wall of the site. */
export function clockMinutes(at: string | Date, zone: string): number {
  const clock = clocks.get(zone) ?? new Intl.DateTimeFormat('en-GB', { hour: '2-digit', minute: '2-digit', hourCycle: 'h23', timeZone: zone })
  clocks.set(zone, clock)
  const [hours = '0', minutes = '0'] = clock.format(typeof at === 'string' ? new Date(at) : at).split(':')
  return Number(hours) * 60 + Number(minutes)
}

/** From the hour in which the first bench opens to the one in which the last shuts, wider where something is planned outside. */
export function dayScale(floor: Floor): DayScale {
  const zoneOf = new Map(floor.sites.flatMap((site) => site.benches.map((bench) => [bench.id, site.timeZone] as const)))
  const spans = [...floor.sites.flatMap((site) => site.benches.flatMap(({ open }) => open.map((one) => ({ ...one, zone: site.timeZone })))), ...floor.strips.flatMap((strip) => {
    const zone = zoneOf.get(strip.benchId)
    return zone ? [{ start: strip.start, end: strip.end, zone }] : []
  })]
  const overnight = spans.some(({ start, end, zone }) => calendarDay(start, zone) !== calendarDay(end, zone) && clockMinutes(end, zone) > 0)
  if (overnight) return { from: 0, to: 24 * 60 }
  const starts = spans.map(({ start, zone }) => clockMinutes(start, zone))
  const ends = spans.map(({ end, zone }) => clockMinutes(end, zone) || 24 * 60)
  return { from: Math.floor(Math.min(8 * 60, ...starts) / 60) * 60, to: Math.ceil(Math.max(16 * 60, ...ends) / 60) * 60 }
}

/** Where a stretch of time lies in the column of a day; undefined when it does not touch the hours shown. */
export function stretchOn(day: string, { start, end }: Pick<FloorStrip, 'start' | 'end'>, zone: string, { from, to }: DayScale): Stretch | undefined {
  const [first, last] = [calendarDay(start, zone), calendarDay(end, zone)]
  if (day < first || day > last) return undefined
  const begin = Math.max(from, day === first ? clockMinutes(start, zone) : from)
  const finish = Math.min(to, day === last ? clockMinutes(end, zone) : to)
  if (finish < begin || (finish === begin && day !== first)) return undefined
  return { left: (100 * (begin - from)) / (to - from), width: (100 * (finish - begin)) / (to - from) }
}

/** Whole hours to write along the top, about three to a day. */
export function hourTicks({ from, to }: DayScale): { hour: number; left: number }[] {
  const step = Math.max(1, Math.round((to - from) / 60 / 3))
  return Array.from({ length: Math.ceil((to - from) / 60 / step) }, (_, place) => from / 60 + place * step).map((hour) => ({ hour, left: (100 * (hour * 60 - from)) / (to - from) }))
}
