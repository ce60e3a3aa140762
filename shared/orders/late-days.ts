const dayMs = 86_400_000

/** Whole days by which a job ends after the day it is due; 0 when it is in time, or when either day is not known. Days are ISO text. */
export function lateDays(dueDay: string | null, endDay: string | null): number {
  if (dueDay === null || endDay === null) return 0
  return Math.max(0, Math.round((Date.parse(`${endDay}T00:00:00Z`) - Date.parse(`${dueDay}T00:00:00Z`)) / dayMs))
}
