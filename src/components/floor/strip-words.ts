import type { FloorStrip } from '../../../shared/api/benches.ts'
import { formatTime, formatWhen, isSameDay } from '../../lib/format.ts'

/** "417" of "J-26-00417": what fits on a strip. */
export function shortNumber(jobNumber: string): string {
  return jobNumber.replace(/^.*-0*(?=\d)/, '')
}

/** "J-26-00417-03, 05, 06": the job's number once, then the samples. */
export function sampleList(jobNumber: string, sampleNumbers: readonly string[]): string {
  const ends = [...new Set(sampleNumbers)].map((number) => (number.startsWith(`${jobNumber}-`) ? number.slice(jobNumber.length + 1) : number))
  return ends.length > 8 ? `${jobNumber}-${ends.slice(0, 6).join(', ')} and ${ends.length - 6} more` : `${jobNumber}-${ends.join(', ')}`
}

/** "Tue 10 Mar, 10:30 to 12:05" */
export function stripTime({ start, end }: Pick<FloorStrip, 'start' | 'end'>, zone: string): string {
  return `${formatWhen(start, 'week', { zone })} to ${isSameDay(start, end, zone) ? formatTime(end, { zone }) : formatWhen(end, 'week', { zone })}`
}

export const stripStates: Record<FloorStrip['state'], string> = { done: 'done', started: 'running', planned: 'planned' }
