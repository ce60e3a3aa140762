import { execFile } from 'node:child_process'
import { randomUUID } from 'node:crypto'
import { mkdtemp, rm } from 'node:fs/promises'
import { tmpdir } from 'node:os'
import { join } from 'node:path'
import { pathToFileURL } from 'node:url'
import { promisify } from 'node:util'
import pg from 'pg'
import { afterAll, inject } from 'vitest'
import { isBuilt } from '../../server/bin/launcher/sources-hash.mjs'
import { template, urlFor } from './template-database.ts'
import { freePort, startBuilt, until, type Running } from './processes.ts'

const run = promisify(execFile)

export type Product = {
  /** Where people reach it. */
  address: string
  /** The page of the mail stand-in. */
  mailAddress: string
  /** The database, for counting what must be there once. */
  query: <Row extends object>(sql: string, values?: readonly unknown[]) => Promise<Row[]>
}

/**
 * The whole product as `npm start` runs it, for one test file: the build, with a database of its own that holds the demonstration, the
 * worker and both stand-ins, on free ports. Builds first when the sources are newer. Ends with the file.
 */
export async function startProduct(): Promise<Product> {
  if (!isBuilt()) await run(process.execPath, ['server/bin/build.mjs'])
  const name = `test_${randomUUID().replaceAll('-', '').slice(0, 16)}`
  const folder = await mkdtemp(join(tmpdir(), 'crosshead-browser-'))
  const running: Running[] = []
  const database = await copyTemplate(name)
  afterAll(async () => {
    await Promise.all(running.map((one) => one.stop()))
    await database.drop()
    await rm(folder, { recursive: true, force: true })
  })

  const [port, mailPort, smtpPort, stripePort] = [await freePort(), await freePort(), await freePort(), await freePort()]
  const address = `http://localhost:${port}`
  const mailAddress = `http://127.0.0.1:${mailPort}`
  const stripe = { STRIPE_SECRET_KEY: 'sk_test_only_for_tests', STRIPE_WEBHOOK_SECRET: 'whsec_only_for_tests' }
  const settings = {
    ...stripe, CROSSHEAD_DEMO: '1', DATABASE_URL: urlFor(inject('adminUrl'), 'crosshead_app', name), REDIS_URL: inject('redisUrl'), QUEUE_PREFIX: name, PORT: String(port), BASE_URL: address,
    STRIPE_API_BASE: `http://127.0.0.1:${stripePort}`, SMTP_URL: `smtp://127.0.0.1:${smtpPort}`, MAIL_FROM: 'Crosshead <no-reply@crosshead.example>', MAIL_PAGE_URL: mailAddress,
    FILES_URL: pathToFileURL(join(folder, 'files')).href, SESSION_SECRET: 'only-for-tests-only-for-tests-only', REPORT_CODE_SECRET: 'only-for-tests-only-for-tests-only',
  }
  await run(process.execPath, ['.build/bin/seed.js'], { env: { PATH: process.env.PATH, NODE_ENV: 'production', ...settings } })
  running.push(
    startBuilt('fakes/stripe.js', { ...stripe, PORT: String(stripePort), WEBHOOK_URL: `http://127.0.0.1:${port}/api/payments/notices` }),
    startBuilt('fakes/mail.js', { PORT: String(mailPort), SMTP_PORT: String(smtpPort), STATE_DIR: join(folder, 'mail') }),
    startBuilt('api/index.js', settings),
    startBuilt('worker/index.js', settings),
  )
  for (const place of [`http://127.0.0.1:${stripePort}`, mailAddress, address]) {
    await until(`${place} answers`, async () => (await fetch(`${place}/healthz`)).ok).catch((error: unknown) => {
      throw new Error(running.map((one) => one.output()).join('\n'), { cause: error })
    })
  }
  return { address, mailAddress, query: database.query }
}

async function copyTemplate(name: string) {
  const admin = new pg.Client({ connectionString: inject('adminUrl') })
  await admin.connect()
  await admin.query(`create database ${name} template ${template} owner crosshead_owner`)
  const reader = new pg.Client({ connectionString: urlFor(inject('adminUrl'), 'crosshead_app', name) })
  await reader.connect()
  return {
    query: async <Row extends object>(sql: string, values: readonly unknown[] = []): Promise<Row[]> => (await reader.query<Row>(sql, [...values])).rows,
    async drop() {
      await reader.end()
      await admin.query(`drop database if exists ${name} with (force)`)
      await admin.end()
    },
  }
}
