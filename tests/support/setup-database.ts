import { randomUUID } from 'node:crypto'
import { mkdtempSync } from 'node:fs'
import { rm } from 'node:fs/promises'
import { tmpdir } from 'node:os'
import { join } from 'node:path'
import pg from 'pg'
import { afterAll, inject } from 'vitest'
import { template, urlFor } from './template-database.ts'

/** Runs before each test file: a copy of the template database and settings of its own, before anything connects. */
const name = `test_${randomUUID().replaceAll('-', '').slice(0, 16)}`
const admin = new pg.Client({ connectionString: inject('adminUrl') })
await admin.connect()
await admin.query(`create database ${name} template ${template} owner crosshead_owner`)

const folder = mkdtempSync(join(tmpdir(), 'crosshead-test-'))
Object.assign(process.env, {
  DATABASE_URL: urlFor(inject('adminUrl'), 'crosshead_app', name),
  DATABASE_OWNER_URL: urlFor(inject('adminUrl'), 'crosshead_owner', name),
  REDIS_URL: inject('redisUrl'),
  QUEUE_PREFIX: name,
  PORT: '0',
  BASE_URL: 'http://127.0.0.1:1',
  STRIPE_SECRET_KEY: 'sk_test_only_for_tests',
  STRIPE_WEBHOOK_SECRET: 'whsec_only_for_tests',
  STRIPE_API_BASE: 'http://127.0.0.1:9',
  SMTP_URL: 'smtp://127.0.0.1:9',
  MAIL_FROM: 'lab@tarnwick.example',
  FILES_URL: `file://${folder}`,
  SESSION_SECRET: 'only-for-tests-only-for-tests-only',
  REPORT_CODE_SECRET: 'only-for-tests-only-for-tests-only',
})

afterAll(async () => {
  const { database } = await import('../../server/database/connection.ts')
  await database.close()
  await admin.query(`drop database if exists ${name} with (force)`)
  await admin.end()
  await rm(folder, { recursive: true, force: true })
})
