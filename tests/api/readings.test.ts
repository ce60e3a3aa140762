import { randomUUID } from 'node:crypto'
import { describe, expect, it } from 'vitest'
import { Job } from '../../server/models/jobs/job.ts'
import { Sample } from '../../server/models/jobs/sample.ts'
import { Step } from '../../server/models/jobs/step.ts'
import { Test } from '../../server/models/jobs/test.ts'
import { Reading } from '../../server/models/runs/reading.ts'
import { Result } from '../../server/models/runs/result.ts'
import { TestRun } from '../../server/models/runs/test-run.ts'
import { evaluate } from '../../shared/evaluate.ts'
import { startTestApp, type Agent } from '../support/app.ts'
import { buildOrder } from '../support/build/jobs.ts'
import { buildLab, buildOpenRun, hardnessReadings, type Lab } from '../support/build/runs.ts'
import { eventsOf } from '../support/events.ts'

const app = await startTestApp()

async function atTheBench(order?: Parameters<typeof buildOpenRun>[1]) {
  const lab: Lab = await buildLab()
  return { lab, agent: await app.agentFor(lab.technician), ...(await buildOpenRun(lab, order)) }
}
const save = (agent: Agent, runId: string, body: object) => agent.put(`/api/test-runs/${runId}/readings`).send({ keep: [], strike: [], ...body })
const record = (agent: Agent, runId: string, version: number, remark = '') => agent.post(`/api/test-runs/${runId}/record`).send({ version, remark })

describe('keeping readings', () => {
  it('keeps what is sent, with who and when, and raises the version', async () => {
    const { agent, run, lab } = await atTheBench()
    const keep = hardnessReadings([31.2, 31.6])
    const { body } = await save(agent, run.id, { version: run.version, keep }).expect(200)
    expect(body.version).toBe(run.version + 1)
    expect(body.readings.map(({ key, path, value, by, struck }: Record<string, unknown>) => ({ key, path, value, by, struck }))).toEqual(keep.map((one) => ({ ...one, by: lab.technician.name, struck: null })))
    expect((await eventsOf(run.id)).at(-1)).toMatchObject({ type: 'test-run.readings-saved', personId: lab.technician.id, data: { kept: 2, struck: 0 } })
  })

  it('keeps a repeated save once, also when both come at once', async () => {
    const { agent, run } = await atTheBench()
    const keep = hardnessReadings([31.2])
    const answers = await Promise.all([1, 2, 3].map(() => save(agent, run.id, { version: run.version, keep })))
    expect(answers.map(({ status }) => status)).toEqual([200, 200, 200])
    const { body: again } = await save(agent, run.id, { version: run.version, keep }).expect(200)
    expect(again).toMatchObject({ version: run.version + 1, readings: [{ key: keep[0]!.key }] })
    expect(await Reading.count({ where: { testRunId: run.id } })).toBe(1)
    expect((await eventsOf(run.id)).filter(({ type }) => type === 'test-run.readings-saved')).toHaveLength(1)
  })

  it('refuses a save on a version that another screen has passed', async () => {
    const { agent, run } = await atTheBench()
    const [first, second] = [hardnessReadings([31.2]), hardnessReadings([40.1], 1)]
    const answers = await Promise.all([save(agent, run.id, { version: run.version, keep: first }), save(agent, run.id, { version: run.version, keep: second })])
    expect(answers.map(({ status }) => status).sort()).toEqual([200, 409])
    expect(answers.find(({ status }) => status === 409)?.body).toMatchObject({ code: 'already-changed', fields: { version: `now ${run.version + 1}, you saw ${run.version}` } })
    expect(await Reading.count({ where: { testRunId: run.id } })).toBe(1)
  })

  it('strikes a reading out with a reason, keeps it on record, and takes another in its place', async () => {
    const { agent, run, lab } = await atTheBench()
    const [wrong, right] = [hardnessReadings([13.2]), hardnessReadings([31.2])]
    const { body: kept } = await save(agent, run.id, { version: run.version, keep: wrong }).expect(200)
    const { body: taken } = await save(agent, run.id, { version: kept.version, keep: right }).expect(422)
    expect(taken.fields).toEqual({ 'readings.0': 'there is a reading already; strike it out with a reason first' })
    const unreasoned = await save(agent, run.id, { version: kept.version, strike: [{ key: wrong[0]!.key, reason: ' ' }] }).expect(422)
    expect(unreasoned.body.fields).toHaveProperty(['strike.0.reason'])
    const strike = [{ key: wrong[0]!.key, reason: 'digits swapped' }]
    const { body: put } = await save(agent, run.id, { version: kept.version, keep: right, strike }).expect(200)
    expect(put.readings.map(({ value, struck }: { value: { value: number }; struck: { reason: string; by: string } | null }) => [value.value, struck?.reason ?? null, struck?.by ?? null])).toEqual([[13.2, 'digits swapped', lab.technician.name], [31.2, null, null]])
    const { body: again } = await save(agent, run.id, { version: kept.version, keep: right, strike }).expect(200)
    expect(again.version).toBe(put.version)
  })

  it('takes a reading that was typed and struck out before it was sent', async () => {
    const { agent, run } = await atTheBench()
    const [gone, live] = [hardnessReadings([13.2]), hardnessReadings([31.2])]
    const { body } = await save(agent, run.id, { version: run.version, keep: [...gone, ...live], strike: [{ key: gone[0]!.key, reason: 'digits swapped' }] }).expect(200)
    expect(body.readings.map(({ struck }: { struck: unknown }) => struck !== null)).toEqual([true, false])
  })

  it('names each place and value that will not do and keeps nothing of the save', async () => {
    const { agent, run } = await atTheBench()
    const [good] = hardnessReadings([31.2])
    const key = () => randomUUID()
    const keep = [
      good, { key: key(), path: 'readings.1', value: { value: 500 } }, { key: key(), path: 'readings.2', value: { value: 31, note: 'x' } }, { key: key(), path: 'readings.03', value: { value: 31 } },
      { key: key(), path: 'readings.constructor', value: 1 }, { key: key(), path: 'parameters.scale', value: 'HRB' }, { key: key(), path: 'elsewhere', value: 1 }, { key: key(), path: 'readings.99999', value: { value: 31 } },
    ]
    const { body } = await save(agent, run.id, { version: run.version, keep, strike: [{ key: 'nothing-of-ours', reason: 'x' }] }).expect(422)
    expect(Object.keys(body.fields).sort()).toEqual(['elsewhere', 'parameters.scale', 'readings.03', 'readings.1', 'readings.2', 'readings.99999', 'readings.constructor', 'strike.nothing-of-ours'])
    expect(body.fields['readings.1']).toMatch(/^value: .*130/)
    expect(body.fields['parameters.scale']).toBe('is ordered by the customer and cannot be changed at the bench')
    expect(await Reading.count({ where: { testRunId: run.id } })).toBe(0)
  })

  it('refuses the same key twice in one save', async () => {
    const { agent, run } = await atTheBench()
    const [one] = hardnessReadings([31.2])
    const { body } = await save(agent, run.id, { version: run.version, keep: [one, { ...one, path: 'readings.1' }] }).expect(422)
    expect(body.fields).toEqual({ [`keep.${one!.key}`]: 'stands twice in one save' })
    const { body: kept } = await save(agent, run.id, { version: run.version, keep: [one] }).expect(200)
    const strike = [1, 2].map(() => ({ key: one!.key, reason: 'slipped' }))
    expect((await save(agent, run.id, { version: kept.version, strike }).expect(422)).body.fields).toEqual({ [`strike.${one!.key}`]: 'stands twice in one save' })
  })

  it('is for the one who carries the run out', async () => {
    const { run, lab } = await atTheBench()
    const other = await save(await app.agentFor(lab.reviewer), run.id, { version: run.version, keep: hardnessReadings() }).expect(403)
    expect(other.body).toMatchObject({ code: 'not-allowed', detail: 'someone else carries out this run' })
    await save(await app.agentFor(lab.manager), run.id, { version: run.version, keep: hardnessReadings() }).expect(403)
    await save(await app.agentFor(lab.client), run.id, { version: run.version, keep: hardnessReadings() }).expect(403)
    await save(await app.agentFor((await buildLab()).technician), run.id, { version: run.version, keep: hardnessReadings() }).expect(404)
  })
})

describe('recording a run', () => {
  it('keeps the results of the engine, word for word, and moves test, step, sample and job', async () => {
    const { agent, run, test, steps, samples: [sample], job } = await atTheBench()
    const keep = hardnessReadings([31.2, 31.6, 31.4])
    const { body: saved } = await save(agent, run.id, { version: run.version, keep }).expect(200)
    const { body: recorded } = await record(agent, run.id, saved.version).expect(200)
    const answer = evaluate({ method: 'rockwell', parameters: test.parameters, readings: keep.map(({ value }) => value) })
    expect(recorded).toMatchObject({ state: 'recorded', version: saved.version + 1 })
    expect(recorded.evaluation).toEqual(JSON.parse(JSON.stringify(answer)))
    // (31.2 + 31.6 + 31.4) / 3 = 31.4
    expect(recorded.evaluation.results[0]).toMatchObject({ key: 'mean', reported: expect.stringContaining('31.4') })
    const rows = await Result.findAll({ where: { testRunId: run.id }, order: [['position', 'ASC']], raw: true })
    expect(rows.map(({ key, symbol, value, unit, reported }) => ({ key, symbol, value, unit, reported }))).toEqual(
      recorded.evaluation.results.map(({ key, symbol, value, unit, reported }: Record<string, unknown>) => ({ key, symbol, value, unit, reported })))
    expect(await Test.findByPk(test.id, { raw: true })).toMatchObject({ state: 'recorded' })
    expect(await Step.findByPk(steps[1]!.id, { raw: true })).toMatchObject({ state: 'done', endedAt: expect.any(Date) })
    expect(await Sample.findByPk(sample!.id, { raw: true })).toMatchObject({ state: 'done' })
    expect(await Job.findByPk(job.id, { raw: true })).toMatchObject({ state: 'in review' })
    expect((await eventsOf(run.id)).at(-1)).toMatchObject({ type: 'test-run.recorded', data: { results: expect.arrayContaining([expect.stringContaining('31.4')]) } })
    expect((await eventsOf(job.id)).map(({ type }) => type)).toContain('job.in-review')
  })

  it('leaves a job in work while other tests are open', async () => {
    const { agent, run, job } = await atTheBench(buildOrder({}, { count: 2 }))
    const { body: saved } = await save(agent, run.id, { version: run.version, keep: hardnessReadings() }).expect(200)
    await record(agent, run.id, saved.version).expect(200)
    expect(await Job.findByPk(job.id, { raw: true })).toMatchObject({ state: 'in work' })
  })

  it('counts a struck-out reading no more', async () => {
    const { agent, run } = await atTheBench()
    const keep = hardnessReadings([31.2, 31.6, 31.4, 60])
    const { body: saved } = await save(agent, run.id, { version: run.version, keep, strike: [{ key: keep[3]!.key, reason: 'on the edge of a bore' }] }).expect(200)
    const { body } = await record(agent, run.id, saved.version).expect(200)
    expect(body.evaluation.results[0].value).toBeCloseTo(31.4, 10)
  })

  it('is refused while a rule is broken, at the reading that breaks it', async () => {
    const { agent, run } = await atTheBench()
    const keep = hardnessReadings().map((one, at) => (at === 1 ? { ...one, value: { value: 31.6, xMm: 7, yMm: 6, edgeMm: 0.1 } } : one))
    const { body: saved } = await save(agent, run.id, { version: run.version, keep }).expect(200)
    const { body, status } = await record(agent, run.id, saved.version, 'let it pass')
    expect([status, Object.keys(body.fields)]).toEqual([422, ['readings.1']])
    expect(body.fields['readings.1']).toMatch(/from the edge/)
    expect(await TestRun.findByPk(run.id, { raw: true })).toMatchObject({ state: 'open', evaluation: null })
    expect(await Result.count({ where: { testRunId: run.id } })).toBe(0)
  })

  it('needs a remark where the method warns', async () => {
    const { agent, run } = await atTheBench()
    const { body: saved } = await save(agent, run.id, { version: run.version, keep: hardnessReadings([31.2, 31.6]) }).expect(200)
    const { body } = await record(agent, run.id, saved.version).expect(422)
    expect(body.fields.remark).toMatch(/2 of the usual 3 readings/)
    const { body: recorded } = await record(agent, run.id, saved.version, 'small piece, two prints fit').expect(200)
    expect(recorded.remark).toBe('small piece, two prints fit')
  })

  it('is refused without readings, on an old version, and by anyone else', async () => {
    const { agent, run, lab } = await atTheBench()
    const { body: none } = await record(agent, run.id, run.version).expect(422)
    expect(Object.keys(none.fields)).toEqual(['readings'])
    await save(agent, run.id, { version: run.version, keep: hardnessReadings() }).expect(200)
    expect((await record(agent, run.id, run.version).expect(409)).body.code).toBe('already-changed')
    await record(await app.agentFor(lab.reviewer), run.id, run.version + 1).expect(403)
  })

  it('happens once when sent twice at once, and its readings stay as they are', async () => {
    const { agent, run } = await atTheBench()
    const { body: saved } = await save(agent, run.id, { version: run.version, keep: hardnessReadings() }).expect(200)
    const answers = await Promise.all([record(agent, run.id, saved.version), record(agent, run.id, saved.version)])
    expect(answers.map(({ status }) => status).sort()).toEqual([200, 409])
    expect((await eventsOf(run.id)).filter(({ type }) => type === 'test-run.recorded')).toHaveLength(1)
    const late = await save(agent, run.id, { version: saved.version + 1, keep: hardnessReadings([50], 7) }).expect(409)
    expect(late.body.detail).toBe('this run is recorded; its readings stay as they are')
  })
})
