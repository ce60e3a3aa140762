import { describe, expect, it } from 'vitest'
import { Job } from '../../server/models/jobs/job.ts'
import { Sample } from '../../server/models/jobs/sample.ts'
import { Step } from '../../server/models/jobs/step.ts'
import { Test } from '../../server/models/jobs/test.ts'
import { Authorisation } from '../../server/models/people/authorisation.ts'
import { Result } from '../../server/models/runs/result.ts'
import { Review } from '../../server/models/runs/review.ts'
import { startTestApp, type Agent } from '../support/app.ts'
import { buildRight } from '../support/build/benches.ts'
import { buildPerson } from '../support/build/people.ts'
import { buildLab, buildOpenRun, buildRecordedRun, measure } from '../support/build/runs.ts'
import { eventsOf } from '../support/events.ts'

const app = await startTestApp()

async function toReview() {
  const lab = await buildLab()
  return { lab, agent: await app.agentFor(lab.reviewer), ...(await buildRecordedRun(lab)) }
}
const review = (agent: Agent, runId: string, body: object) => agent.post(`/api/test-runs/${runId}/review`).send({ outcome: 'accepted', remark: '', ...body })

describe('a review', () => {
  it('by a second authorised person accepts the run', async () => {
    const { agent, run, test, job, lab } = await toReview()
    const { body } = await review(agent, run.id, { version: run.version }).expect(200)
    expect(body).toMatchObject({ state: 'accepted', version: run.version + 1, reviews: [{ outcome: 'accepted', by: lab.reviewer.name }] })
    expect(await Test.findByPk(test.id, { raw: true })).toMatchObject({ state: 'accepted' })
    expect(await Job.findByPk(job.id, { raw: true })).toMatchObject({ state: 'in review' })
    expect((await eventsOf(run.id)).at(-1)).toMatchObject({ type: 'test-run.accepted', personId: lab.reviewer.id })
  })

  it('of an own run is refused to a technician, with the reason, whatever their authorisations', async () => {
    const { run, test, lab } = await toReview()
    const own = await app.agentFor(lab.technician)
    const { body } = await review(own, run.id, { version: run.version }).expect(403)
    expect(body).toMatchObject({ code: 'not-allowed', detail: 'You ran this test. Someone else has to review it.' })
    expect((await own.get(`/api/test-runs/${run.id}`).expect(200)).body.notMineToReview).toBe('You ran this test. Someone else has to review it.')
    await review(own, run.id, { version: run.version, outcome: 'sent back', remark: 'again' }).expect(403)
    expect(await Test.findByPk(test.id, { raw: true })).toMatchObject({ state: 'recorded' })
    expect(await Review.count({ where: { testRunId: run.id } })).toBe(0)
    const { body: list } = await own.get('/api/reviews').expect(200)
    expect(list.items).toMatchObject([{ testRunId: run.id, isOwn: true }])
  })

  it('needs an authorisation to review this method that has not ended', async () => {
    const { run, lab } = await toReview()
    const other = await buildPerson({ role: 'technician', siteId: lab.site.id })
    const agent = await app.agentFor(other)
    await buildRight(other, lab.site.id, 'carry out')
    await buildRight(other, lab.site.id, 'review', { until: '2020-01-31' })
    await buildRight(other, lab.site.id, 'review', { methodId: 'tensile' })
    const { body } = await review(agent, run.id, { version: run.version }).expect(403)
    expect(body.detail).toBe('You are not authorised to review Rockwell hardness, or the authorisation has ended.')
    expect((await agent.get(`/api/test-runs/${run.id}`)).body.notMineToReview).toBe(body.detail)
    await buildRight(other, lab.site.id, 'review')
    expect((await agent.get(`/api/test-runs/${run.id}`)).body.notMineToReview).toBe('')
    await review(agent, run.id, { version: run.version }).expect(200)
  })

  it('by an authorised manager is one too', async () => {
    const { run, lab } = await toReview()
    await buildRight(lab.manager, lab.site.id, 'review')
    await review(await app.agentFor(lab.manager), run.id, { version: run.version }).expect(200)
  })

  it('cannot accept when the performer\'s authorisation has ended, but can send back', async () => {
    const { agent, run, lab } = await toReview()
    await Authorisation.update({ until: '2020-01-31' }, { where: { personId: lab.technician.id, right: 'carry out' } })
    const { body } = await review(agent, run.id, { version: run.version }).expect(403)
    expect(body.detail).toBe('The authorisation to carry out Rockwell hardness of the person who ran this test has ended. It cannot be accepted.')
    expect((await agent.get(`/api/test-runs/${run.id}`)).body).toMatchObject({ state: 'recorded', authorisedUntil: null })
    await review(agent, run.id, { version: run.version, outcome: 'sent back', remark: 'by someone who is authorised' }).expect(200)
  })

  it('that sends back needs a remark, makes the test ready again, and keeps the run and its results', async () => {
    const { agent, run, test, steps, job, samples: [sample], lab } = await toReview()
    expect((await review(agent, run.id, { version: run.version, outcome: 'sent back', remark: ' ' }).expect(422)).body.fields).toHaveProperty('remark')
    const doubted = [run.readings[1]!.id]
    const { body } = await review(agent, run.id, { version: run.version, outcome: 'sent back', remark: 'print 2 is on a scratch', readings: doubted }).expect(200)
    expect(body).toMatchObject({ state: 'sent back', reviews: [{ outcome: 'sent back', remark: 'print 2 is on a scratch', readings: doubted }] })
    expect(await Test.findByPk(test.id, { raw: true })).toMatchObject({ state: 'ready' })
    expect(await Step.findByPk(steps[1]!.id, { raw: true })).toMatchObject({ state: 'to come', benchId: null, startedAt: null, endedAt: null })
    expect(await Sample.findByPk(sample!.id, { raw: true })).toMatchObject({ state: 'in work' })
    expect(await Job.findByPk(job.id, { raw: true })).toMatchObject({ state: 'in work' })
    const technician = await app.agentFor(lab.technician)
    const { body: second } = await technician.post(`/api/tests/${test.id}/runs`).send({ benchId: lab.hardness.id }).expect(200)
    expect(second).toMatchObject({ number: 2, readings: [], state: 'open' })
    const recorded = await measure(lab, second)
    await review(agent, second.id, { version: recorded.version }).expect(200)
    expect((await agent.get(`/api/test-runs/${run.id}`).expect(200)).body).toMatchObject({ state: 'sent back', number: 1, evaluation: { results: expect.any(Array) } })
    expect(await Result.count({ where: { testRunId: run.id } })).toBeGreaterThan(0)
    expect(await Job.findByPk(job.id, { raw: true })).toMatchObject({ state: 'in review' })
  })

  it('names only readings of the run', async () => {
    const { agent, run, lab } = await toReview()
    const other = await buildRecordedRun(lab)
    const { body } = await review(agent, run.id, { version: run.version, outcome: 'sent back', remark: 'x', readings: [other.run.readings[0]!.id] }).expect(422)
    expect(body.fields).toEqual({ readings: 'are not all of this run' })
  })

  it('happens once when two reviewers decide at once', async () => {
    const { agent, run, lab } = await toReview()
    await buildRight(lab.manager, lab.site.id, 'review')
    const answers = await Promise.all([
      review(agent, run.id, { version: run.version }), review(await app.agentFor(lab.manager), run.id, { version: run.version, outcome: 'sent back', remark: 'again' }),
    ])
    expect(answers.map(({ status }) => status).sort()).toEqual([200, 409])
    expect(await Review.count({ where: { testRunId: run.id } })).toBe(1)
  })

  it('comes after the record and before nothing else: open, accepted and stale runs are refused', async () => {
    const lab = await buildLab()
    const agent = await app.agentFor(lab.reviewer)
    const { run: open } = await buildOpenRun(lab)
    expect((await review(agent, open.id, { version: open.version }).expect(409)).body.detail).toBe('this run is still at the bench')
    const { run } = await buildRecordedRun(lab)
    expect((await review(agent, run.id, { version: run.version - 1 }).expect(409)).body.code).toBe('already-changed')
    await review(agent, run.id, { version: run.version }).expect(200)
    expect((await review(agent, run.id, { version: run.version + 1, outcome: 'sent back', remark: 'too late' }).expect(409)).body.detail).toBe('this run is accepted already')
  })

  it('is no business of the client or of another site', async () => {
    const { run, lab } = await toReview()
    await review(await app.agentFor(lab.client), run.id, { version: run.version }).expect(403)
    const elsewhere = await buildLab()
    await review(await app.agentFor(elsewhere.reviewer), run.id, { version: run.version }).expect(404)
    expect((await (await app.agentFor(elsewhere.reviewer)).get('/api/reviews').expect(200)).body.items).toEqual([])
  })
})

it('the list of reviews has the most urgent first and says how many warnings a run has', async () => {
  const lab = await buildLab()
  const [late, soon] = [await buildRecordedRun(lab), await buildRecordedRun(lab)]
  await Job.update({ neededBy: '2030-06-01' }, { where: { id: late.job.id } })
  await Job.update({ neededBy: '2030-05-01' }, { where: { id: soon.job.id } })
  const { body } = await (await app.agentFor(lab.reviewer)).get('/api/reviews').expect(200)
  expect(body.items.map(({ jobId }: { jobId: string }) => jobId)).toEqual([soon.job.id, late.job.id])
  expect(body.items[0]).toMatchObject({ isOwn: false, unusual: 0, label: 'Rockwell HRC', performedBy: lab.technician.name, customerName: lab.customer.name })
})
