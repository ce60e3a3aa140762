import type { SampleNow, StepNow, TestNow } from './sample-traveller.ts'

/** What is happening with a sample, in a few words: "measure HRC on Hardness 1", "next: pull on Frame 100", "waits for review". */
export function sampleWords(sample: Pick<SampleNow, 'state' | 'onHold'>, steps: readonly StepNow[], tests: readonly TestNow[]): string {
  if (sample.state === 'void') return 'void'
  if (sample.onHold) return 'on hold'
  if (sample.state === 'missing') return 'missing'
  if (sample.state === 'expected') return 'not here yet'
  const started = steps.find(({ state }) => state === 'started')
  if (started) return at(started)
  const next = steps.find(({ state }) => state === 'to come' || state === 'planned')
  if (next) return `next: ${at(next)}`
  const live = tests.filter(({ state }) => state !== 'void')
  if (live.some(({ state }) => state === 'recorded')) return 'waits for review'
  if (live.length > 0 && live.every(({ state }) => state === 'reported')) return 'reported'
  if (live.length > 0 && live.every(({ state }) => state === 'accepted' || state === 'reported')) return 'waits for the report'
  return 'waits for the bench'
}

function at({ label, place }: StepNow): string {
  return place ? `${label} on ${place}` : label
}
