import type { Traveller, TravellerNode } from '../api/basics.ts'
import type { StepKind } from '../method/method.ts'
import { closedNode, isTesting, placedNode, reportNode, type JobNow } from './sample-traveller.ts'

/** How many samples of a job have a step with this label, and how far they are with it. Void ones are not counted. */
export type StepTally = { label: string; type: StepKind; total: number; done: number; started: number; held: number; sentBack: number }
export type SampleTally = { total: number; received: number; missing: number }
export type TestTally = { total: number; recorded: number; accepted: number }

type Share = { total: number; done: number; now: number; held: number; back: number }

/** One line for all samples of a job: the same nodes, each with the share of samples that are past it. Steps stand in the order given. */
export function jobTraveller(
  { job, samples, steps, tests, closed = false }: { job: JobNow; samples: SampleTally; steps: readonly StepTally[]; tests: TestTally; closed?: boolean },
): Traveller {
  const nodes: Traveller = [
    placedNode(job),
    { kind: 'prep', stage: 'awaiting samples', label: 'receive', ...shared({ total: samples.total, done: samples.received, now: 0, held: samples.missing, back: 0 }), at: null, place: null },
    ...steps.map((step): TravellerNode => ({
      kind: isTesting(step.type) ? 'test' : 'prep', stage: 'in work', label: step.label, at: null, place: null,
      ...shared({ total: step.total, done: step.done, now: step.started, held: step.held, back: step.sentBack }),
    })),
    { kind: 'review', stage: 'in review', label: 'review', ...reviewed(tests), at: null, place: null },
    reportNode(job),
    ...(closed ? [closedNode(job)] : []),
  ]
  return job.state === 'cancelled' ? nodes.map((node) => (node.state === 'done' ? node : { ...node, state: 'void' })) : nodes
}

/** Review is on only when nothing is left to measure, so that the line reaches no further than the work. */
function reviewed({ total, recorded, accepted }: TestTally): Pick<TravellerNode, 'state' | 'part'> {
  const { part, state } = shared({ total, done: accepted, now: recorded, held: 0, back: 0 })
  return { state: recorded + accepted === total ? state : 'todo', ...(part !== undefined && { part }) }
}

/** What stops all that is left comes before what runs, and what runs before what is merely part done. */
function shared({ total, done, now, held, back }: Share): Pick<TravellerNode, 'state' | 'part'> {
  const part = total === 0 ? undefined : Math.min(1, done / total)
  const left = total - done
  const state = total === 0 ? 'todo' : left <= 0 && back === 0 ? 'done' : now > 0 ? 'now' : held > 0 && held >= left ? 'held' : back > 0 ? 'back' : done > 0 ? 'part' : 'todo'
  return { state, ...(part !== undefined && { part }) }
}
