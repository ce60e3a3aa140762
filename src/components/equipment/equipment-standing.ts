import type { EquipmentState } from '../../../shared/api/benches.ts'

/** `bad`: nothing may be measured with it. `soon`: its calibration ends within four weeks. */
export type Standing = { level: 'bad' | 'soon' | 'good'; words: string }

const dayMs = 86_400_000
const soonDays = 28

/** Whole days from one calendar day to another. */
export function daysBetween(from: string, to: string): number {
  return Math.round((Date.parse(to) - Date.parse(from)) / dayMs)
}

/** What a machine is good for today, worst first: out of use, calibration over or missing, verification failed, due soon. */
export function equipmentStanding({ outOfUse, calibratedUntil, lastVerification }: EquipmentState, today: string): Standing {
  if (outOfUse) return { level: 'bad', words: 'out of use' }
  if (!calibratedUntil) return { level: 'bad', words: 'no calibration on record' }
  const left = daysBetween(today, calibratedUntil)
  if (left < 0) return { level: 'bad', words: `calibration ${countDays(-left)} over` }
  if (lastVerification && !lastVerification.passed) return { level: 'bad', words: 'verification failed' }
  if (left <= soonDays) return { level: 'soon', words: left === 0 ? 'calibration ends today' : `calibration ends in ${countDays(left)}` }
  return { level: 'good', words: 'in use' }
}

const countDays = (days: number) => (days === 1 ? '1 day' : `${days} days`)
