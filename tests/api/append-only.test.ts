import { QueryTypes, type Model, type ModelStatic } from 'sequelize'
import { beforeAll, describe, expect, it } from 'vitest'
import { v7 } from 'uuid'
import { database } from '../../server/database/connection.ts'
import { Reading } from '../../server/models/runs/reading.ts'
import { Result } from '../../server/models/runs/result.ts'
import { Review } from '../../server/models/runs/review.ts'
import { Strike } from '../../server/models/runs/strike.ts'
import { Report } from '../../server/models/reports/report.ts'
import { saveReadings } from '../../server/services/test-runs/save-readings.ts'
import { recordRun } from '../../server/services/test-runs/record-run.ts'
import { reviewRun } from '../../server/services/test-runs/review-run.ts'
import { buildLab, buildOpenRun, hardnessReadings } from '../support/build/runs.ts'
import { callerFor } from '../support/caller.ts'
import { asSuperuser } from '../support/superuser.ts'

const tables = ['events', 'readings', 'strikes', 'results', 'reviews', 'reports']
const models: ModelStatic<Model>[] = [Reading, Strike, Result, Review, Report]
const countOf = async (name: string) => (await database.query<{ count: number }>(`select count(*) as count from ${name}`, { type: QueryTypes.SELECT }))[0]!.count

/** A run that was measured with a slip, recorded and accepted, so that every table has rows. */
beforeAll(async () => {
  const lab = await buildLab()
  const { run, job } = await buildOpenRun(lab)
  const [technician, reviewer] = [await callerFor(lab.technician), await callerFor(lab.reviewer)]
  const keep = hardnessReadings([13.2, 31.2, 31.6, 31.4])
  const saved = await saveReadings(run.id, { version: run.version, keep, strike: [{ key: keep[0]!.key, reason: 'digits swapped' }] }, technician)
  const recorded = await recordRun(run.id, { version: saved.version, remark: '' }, technician)
  await reviewRun(run.id, { version: recorded.version, outcome: 'accepted', remark: '', readings: [] }, reviewer)
  await database.query(
    `insert into reports (id, job_id, customer_id, site_id, number, revision, code, content, signed_by_id, issued_at, created_at) values ($1, $2, $3, $4, 'R-00-00001', 1, 'code', '{}', $5, now(), now())`,
    { bind: [v7(), job.id, job.customerId, job.siteId, lab.manager.id] },
  )
})

describe.each(tables)('%s', (name) => {
  it('have rows for this test to fail to change', async () => {
    expect(await countOf(name)).toBeGreaterThan(0)
  })

  it.each([
    ['updated', `update ${name} set id = id`],
    ['deleted', `delete from ${name}`],
    ['emptied', `truncate ${name} cascade`],
    ['merged away', `with gone as (delete from ${name} returning 1) select count(*) from gone`],
    ['locked away by dropping their guard', `alter table ${name} disable trigger all`],
    ['dropped', `drop table ${name} cascade`],
  ])('cannot be %s by the application\'s user', async (_what, sql) => {
    const before = await countOf(name)
    await expect(database.query(sql)).rejects.toThrow(/permission denied|must be owner/)
    expect(await countOf(name)).toBe(before)
  })

  it('refuse a change even to their owner', async () => {
    const { default: pg } = await import('pg')
    const owner = new pg.Client({ connectionString: process.env.DATABASE_OWNER_URL })
    await owner.connect()
    try {
      for (const sql of [`update ${name} set id = id`, `delete from ${name}`, `truncate ${name} cascade`]) await expect(owner.query(sql), sql).rejects.toThrow(/is append-only: a mistake is put right by a new row/)
    } finally {
      await owner.end()
    }
  })
})

describe.each(models.map((model) => [model.name, model] as const))('the model %s', (_name, model) => {
  it('can neither update nor destroy nor empty', async () => {
    const [row] = await model.findAll({ limit: 1 })
    const id = row!.get('id')
    await expect(model.update({ createdAt: new Date(0) }, { where: { id } })).rejects.toThrow(/permission denied/)
    await expect(model.destroy({ where: { id } })).rejects.toThrow(/permission denied/)
    await expect(model.truncate()).rejects.toThrow(/permission denied/)
    await expect(row!.destroy()).rejects.toThrow(/permission denied/)
    await expect(model.upsert({ ...row!.get({ plain: true }) as object })).rejects.toThrow(/permission denied/)
    expect(await model.count({ where: { id } })).toBe(1)
  })
})

it('the application\'s user owns nothing and can neither make nor hand on rights', async () => {
  const [{ count: owned }] = await asSuperuser(async (client) => (await client.query<{ count: number }>(`select count(*)::int as count from pg_class where relowner = 'crosshead_app'::regrole`)).rows) as [{ count: number }]
  expect(owned).toBe(0)
  await expect(database.query('create table mine (id int)')).rejects.toThrow(/permission denied/)
  await expect(database.query('set role crosshead_owner')).rejects.toThrow(/permission denied/)
  await expect(database.query('set session_replication_role = replica')).rejects.toThrow(/permission denied/)
  await expect(database.query('select * from migrations')).rejects.toThrow(/permission denied/)
})

it('every guarded table is among those of this test', async () => {
  const rows = await database.query<{ name: string }>(`select c.relname as name from pg_trigger t join pg_class c on c.oid = t.tgrelid where t.tgname = 'append_only' order by 1`, { type: QueryTypes.SELECT })
  expect(rows.map(({ name }) => name)).toEqual([...tables].sort())
})
