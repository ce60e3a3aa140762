import type { JobRow } from '../../../../shared/api/jobs.ts'
import { formatDay } from '../../../lib/format.ts'

/** The day of a job's list row and what is said under it. */
export type DueWords = { day: string | null; under: string; late: boolean }

/** When a job is due, and how that stands: reported, late, expected, days in hand. Days are the site's. */
export function dueWords({ state, neededBy, expectedAt, lateDays, report }: Pick<JobRow, 'state' | 'neededBy' | 'expectedAt' | 'lateDays' | 'report'>, zone: string): DueWords {
  const day = neededBy ?? (expectedAt && dayOf(expectedAt, zone))
  if (state === 'cancelled') return { day: null, under: 'cancelled', late: false }
  if (state === 'draft') return { day: neededBy, under: neededBy ? 'wished' : 'not placed', late: false }
  if (report?.issuedAt) return { day, under: `reported ${formatDay(report.issuedAt, 'week', { zone })}`, late: false }
  if (lateDays > 0) return { day, under: `${days(lateDays)} late${expectedAt ? `: ${formatDay(expectedAt, 'week', { zone })}` : ''}`, late: true }
  if (!expectedAt) return { day, under: 'not planned yet', late: false }
  const inHand = neededBy ? daysBetween(dayOf(expectedAt, zone), neededBy) : 0
  return { day, under: inHand > 0 ? `on time, ${days(inHand)} in hand` : 'on time', late: false }
}

/** "1 day", "3 days". */
export function days(count: number): string {
  return count === 1 ? '1 day' : `${count} days`
}

/** The calendar day of an instant at the site, ISO 8601. */
export function dayOf(at: string, zone: string): string {
  return new Intl.DateTimeFormat('en-CA', { year: 'numeric', month: '2-digit', day: '2-digit', timeZone: zone }).format(new Date(at))
}

/** Whole days from one calendar day to another; negative when the other is before. */
export function daysBetween(from: string, to: string): number {
  return Math.round((Date.parse(`${to}T00:00:00Z`) - Date.parse(`${from}T00:00:00Z`)) / 86_400_000)
}
