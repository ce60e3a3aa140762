import { describe, expect, it } from 'vitest'
import { jobTraveller, type StepTally } from '../../../shared/travellers/job-traveller.ts'
import { sampleTraveller, type JobNow, type SampleNow, type StepNow, type TestNow } from '../../../shared/travellers/sample-traveller.ts'
import { sampleWords } from '../../../shared/travellers/sample-words.ts'

const job: JobNow = { state: 'in work', placedAt: '2026-03-02T09:00:00Z', expectedAt: '2026-03-13T12:00:00Z', report: null }
const sample: SampleNow = { state: 'in work', onHold: false, receivedAt: '2026-03-05T09:20:00Z', place: 'Tarnwick' }
const step = (label: string, state: StepNow['state'], more: Partial<StepNow> = {}): StepNow => ({
  id: label, label, type: label.startsWith('measure') ? 'measure' : 'section', testId: label.startsWith('measure') ? 't' : null, state, startedAt: null, endedAt: null, plannedAt: '2026-03-10T08:00:00Z', place: 'Bench', ...more,
})
const test = (state: TestNow['state'], more: Partial<TestNow> = {}): TestNow => ({ id: 't', state, sentBack: false, acceptedAt: null, ...more })
const states = (nodes: { label: string; state: string }[]) => nodes.map(({ label, state }) => `${label} ${state}`)

describe('a sample\'s line', () => {
  it('says what is done, runs now and is to come, where and when', () => {
    const steps = [step('section', 'done', { endedAt: '2026-03-06T08:30:00Z' }), step('measure HRC', 'started', { startedAt: '2026-03-09T14:10:00Z', place: 'Hardness 1' })]
    const line = sampleTraveller({ job, sample, steps, tests: [test('in run')], closed: true })
    expect(states(line)).toEqual(['placed done', 'receive done', 'section done', 'measure HRC now', 'review todo', 'report todo', 'closed todo'])
    expect(line.map(({ kind }) => kind)).toEqual(['end', 'prep', 'prep', 'test', 'review', 'report', 'end'])
    expect(line[3]).toMatchObject({ at: '2026-03-09T14:10:00Z', place: 'Hardness 1', stage: 'in work', stepId: 'measure HRC' })
    expect(line[2]?.at).toBe('2026-03-06T08:30:00Z')
    expect(line[5]?.at).toBe(job.expectedAt)
  })

  it('holds the step that cannot go on, and none that is done', () => {
    expect(states(sampleTraveller({ job, sample: { ...sample, onHold: true }, steps: [step('section', 'done'), step('measure HRC', 'planned')], tests: [] }))).toContain('measure HRC held')
    const notHere = sampleTraveller({ job, sample: { ...sample, onHold: true, receivedAt: null, state: 'missing' }, steps: [step('section', 'planned')], tests: [] })
    expect(states(notHere).slice(1, 3)).toEqual(['receive held', 'section todo'])
  })

  it('sends a test back whose run was not accepted', () => {
    expect(states(sampleTraveller({ job, sample, steps: [step('measure HRC', 'planned')], tests: [test('ready', { sentBack: true })] }))).toContain('measure HRC back')
    expect(states(sampleTraveller({ job, sample, steps: [step('measure HRC', 'started')], tests: [test('in run', { sentBack: true })] }))).toContain('measure HRC now')
  })

  it('is in review once every run waits or is accepted, not while something is left to measure, and done with the last', () => {
    const review = (...tests: TestNow[]) => sampleTraveller({ job, sample, steps: [], tests })[2]
    const accepted = test('accepted', { acceptedAt: '2026-03-12T10:00:00Z' })
    expect(review(test('recorded'), accepted)).toMatchObject({ state: 'now', part: 0.5 })
    expect(review(test('in run'), accepted)).toMatchObject({ state: 'todo', part: 0.5 })
    expect(review(test('in run'), test('recorded'))?.state).toBe('todo')
    expect(review(accepted, test('void'))).toMatchObject({ state: 'done', at: '2026-03-12T10:00:00Z' })
    expect(review(test('void'))?.state).toBe('todo')
  })

  it('ends with the report, and all that was to come is void once it is called off', () => {
    const issued = { state: 'current' as const, issuedAt: '2026-03-13T11:00:00Z' }
    expect(sampleTraveller({ job: { ...job, report: issued }, sample, steps: [], tests: [] })[3]).toMatchObject({ state: 'done', at: issued.issuedAt })
    expect(sampleTraveller({ job: { ...job, report: { ...issued, state: 'being made' } }, sample, steps: [], tests: [] })[3]?.state).toBe('now')
    expect(states(sampleTraveller({ job: { ...job, state: 'cancelled' }, sample: { ...sample, receivedAt: null }, steps: [step('section', 'void')], tests: [] }))).toEqual(['placed done', 'receive void', 'section void', 'review void', 'report void'])
  })
})

describe('a job\'s line', () => {
  const tally = (label: string, more: Partial<StepTally>): StepTally => ({ label, type: 'section', total: 4, done: 0, started: 0, held: 0, sentBack: 0, ...more })
  const line = (steps: StepTally[], received = 4) => jobTraveller({ job, samples: { total: 4, received, missing: 0 }, steps, tests: { total: 4, recorded: 0, accepted: 1 } })

  it('gives each node the share of samples that are past it', () => {
    const nodes = line([tally('section', { done: 4 }), tally('mount', { done: 1, started: 1 }), tally('etch', { done: 1 }), tally('pull', {})], 3)
    expect(states(nodes)).toEqual(['placed done', 'receive part', 'section done', 'mount now', 'etch part', 'pull todo', 'review todo', 'report todo'])
    expect(nodes.slice(1, 7).map(({ part }) => part)).toEqual([0.75, 1, 0.25, 0.25, 0, 0.25])
  })

  it('is held only where everything left is', () => {
    expect(states(line([tally('section', { done: 3, held: 1 }), tally('mount', { done: 1, held: 1 })])).slice(2, 4)).toEqual(['section held', 'mount part'])
    expect(states(line([tally('measure', { done: 3, sentBack: 1 })]))[2]).toBe('measure back')
  })
})

describe('a sample in words', () => {
  it.each([
    [{ ...sample, state: 'expected' as const }, [], [], 'not here yet'], [{ ...sample, onHold: true }, [], [], 'on hold'], [sample, [step('section', 'done'), step('measure HRC', 'started')], [], 'measure HRC on Bench'],
    [sample, [step('section', 'planned', { place: null })], [], 'next: section'], [sample, [], [test('recorded')], 'waits for review'], [sample, [], [test('accepted')], 'waits for the report'], [sample, [], [test('reported')], 'reported'],
  ])('%#', (now, steps, tests, words) => expect(sampleWords(now, steps, tests)).toBe(words))
})
