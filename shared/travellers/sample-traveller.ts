import type { Traveller, TravellerNode } from '../api/basics.ts'
import type { JobState, ReportState, SampleState, StepState, TestState } from '../api/words.ts'
import type { StepKind } from '../method/method.ts'

/** A step as it stands now. Times are ISO text; `place` is the bench it is done at or planned on. */
export type StepNow = {
  id: string; label: string; type: StepKind; testId: string | null; state: StepState
  startedAt: string | null; endedAt: string | null; plannedAt: string | null; place: string | null
}
/** A test as it stands now; `sentBack` when its last run was not accepted and it waits to be done again. */
export type TestNow = { id: string; state: TestState; sentBack: boolean; acceptedAt: string | null }
export type ReportNow = { state: ReportState; issuedAt: string | null }
/** What the line says of the job, whichever sample it is for. */
export type JobNow = { state: JobState; placedAt: string | null; expectedAt: string | null; report: ReportNow | null }
export type SampleNow = { state: SampleState; onHold: boolean; receivedAt: string | null; place: string | null }

/** One sample's traveller line: placed, receive, each step in order, review, report, and closed at the end when asked. */
export function sampleTraveller(
  { job, sample, steps, tests, closed = false }: { job: JobNow; sample: SampleNow; steps: readonly StepNow[]; tests: readonly TestNow[]; closed?: boolean },
): Traveller {
  const dead = job.state === 'cancelled' || sample.state === 'void'
  const sentBack = new Set(tests.filter((test) => test.sentBack).map(({ id }) => id))
  // a hold stops whatever comes next, the work at the bench first
  const stopped = sample.onHold ? (steps.find(({ state }) => state === 'started') ?? steps.find(({ state }) => state === 'to come' || state === 'planned')) : undefined
  const missing = sample.state === 'missing' || (sample.onHold && sample.receivedAt === null)
  const nodes: Traveller = [
    placedNode(job),
    { kind: 'prep', stage: 'awaiting samples', label: 'receive', state: sample.receivedAt ? 'done' : missing ? 'held' : 'todo', at: sample.receivedAt, place: sample.place },
    ...steps.map((step) => stepNode(step, { held: step === stopped && !missing, sentBack })),
    reviewNode(tests),
    reportNode(job),
    ...(closed ? [closedNode(job)] : []),
  ]
  return dead ? nodes.map((node) => (node.state === 'done' ? node : { ...node, state: 'void' })) : nodes
}

function stepNode(step: StepNow, { held, sentBack }: { held: boolean; sentBack: ReadonlySet<string> }): TravellerNode {
  const kind = isTesting(step.type) ? 'test' : 'prep'
  const again = kind === 'test' && step.testId !== null && sentBack.has(step.testId)
  const byState: Record<StepState, TravellerNode['state']> = { 'to come': 'todo', planned: 'todo', started: 'now', done: 'done', void: 'void' }
  const state = held ? 'held' : again && step.state !== 'started' && step.state !== 'void' ? 'back' : byState[step.state]
  return { kind, stage: 'in work', label: step.label, state, at: step.endedAt ?? step.startedAt ?? step.plannedAt, place: step.place, stepId: step.id }
}

/** Whether a number comes out of this kind of step. */
export function isTesting(type: StepKind): boolean {
  return type === 'measure' || type === 'pull'
}

function reviewNode(tests: readonly TestNow[]): TravellerNode {
  const live = tests.filter(({ state }) => state !== 'void')
  const accepted = live.filter(({ state }) => state === 'accepted' || state === 'reported')
  // the line reaches as far as work has come: review is on only when nothing is left to measure
  const waiting = live.filter(({ state: is }) => is === 'recorded').length
  const state = live.length > 0 && accepted.length === live.length ? 'done' : waiting > 0 && waiting + accepted.length === live.length ? 'now' : 'todo'
  const at = state === 'done' ? accepted.map(({ acceptedAt }) => acceptedAt).reduce(later, null) : null
  return { kind: 'review', stage: 'in review', label: 'review', state, ...(live.length > 0 && { part: accepted.length / live.length }), at, place: null }
}

const later = (one: string | null, other: string | null) => (one === null || (other !== null && Date.parse(other) > Date.parse(one)) ? other : one)

/** When the job was placed. */
export function placedNode(job: JobNow): TravellerNode {
  return { kind: 'end', stage: 'placed', label: 'placed', state: job.placedAt ? 'done' : 'todo', at: job.placedAt, place: null }
}

/** The report: its issue once it is there, before that the day it is expected. */
export function reportNode({ report, expectedAt }: JobNow): TravellerNode {
  const state = report === null || report.state === 'withdrawn' ? 'todo' : report.state === 'being made' ? 'now' : 'done'
  return { kind: 'report', stage: 'reported', label: 'report', state, at: state === 'todo' ? expectedAt : (report?.issuedAt ?? null), place: null }
}

/** The end of the line: nothing is left to do for anyone. */
export function closedNode(job: JobNow): TravellerNode {
  return { kind: 'end', stage: 'closed', label: 'closed', state: job.state === 'closed' ? 'done' : 'todo', at: null, place: null }
}
