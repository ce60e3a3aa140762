import type { TravellerNode } from '../../../../shared/api/basics.ts'

/** Where the samples of a job are, from its traveller: "now pull", "grind and polish 75 %". Empty when nothing is going on. */
export function standingWords(traveller: readonly TravellerNode[]): string {
  const back = traveller.find(({ state }) => state === 'back')
  if (back) return `${back.label} sent back`
  const now = traveller.find(({ state }) => state === 'now')
  if (now) return now.kind === 'review' || now.kind === 'report' || now.kind === 'end' ? '' : `now ${now.label}`
  const part = traveller.findLast(({ state }) => state === 'part')
  return part ? `${part.label} ${Math.round((part.part ?? 0) * 100)} %` : ''
}
