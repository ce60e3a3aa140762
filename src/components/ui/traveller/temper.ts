/** The temper row, as steel runs through it when it gets hotter: how far a piece of work is, and nothing else. */
export const temperRow = ['straw', 'gold', 'bronze', 'purple', 'blue', 'slate'] as const
export type Temper = (typeof temperRow)[number]

type Stage = 'placed' | 'awaiting samples' | 'in work' | 'in review' | 'reported' | 'closed'
const stages: Record<Stage, Temper> = { placed: 'straw', 'awaiting samples': 'gold', 'in work': 'bronze', 'in review': 'purple', reported: 'blue', closed: 'slate' }

/** The colour of a stage of a job, on the traveller line and in lists. */
export function temperOf(stage: Stage): Temper {
  return stages[stage]
}
