import { afterAll } from 'vitest'
import { startFakeMail } from '../../fakes/mail/create-fake-mail.ts'
import { startFakeStripe } from '../../fakes/stripe/create-fake-stripe.ts'
import { database } from '../../server/database/connection.ts'
import { freePort, startProcess, startRedis, until, type Running } from './processes.ts'
import { buildWorkingHouse, signIn } from './story.ts'

/**
 * The product as processes that a test may kill: one API or more, a Redis of its own, stand-ins for payment and mail, and
 * a house with a client, a technician and a manager signed in. Workers are started by the test.
 */
export async function startFaultHouse({ apis = 1 } = {}) {
  const redisPort = await freePort()
  const ports = await Promise.all(Array.from({ length: apis }, freePort))
  const addresses = ports.map((port) => `http://127.0.0.1:${port}`)
  const mail = await startFakeMail({})
  const stripe = await startFakeStripe({
    webhookUrl: `${addresses.at(-1)}/api/payments/notices`, secretKey: process.env.STRIPE_SECRET_KEY!, webhookSecret: process.env.STRIPE_WEBHOOK_SECRET!, retryDelaysMs: [300, 1000, 3000],
  })
  const settings = {
    PORT: String(ports[0]), BASE_URL: addresses[0]!, REDIS_URL: `redis://127.0.0.1:${redisPort}`, STRIPE_API_BASE: stripe.url, SMTP_URL: mail.smtpUrl,
    WORKER_LOCK_MS: '2000', WORKER_SWEEP_MS: '1000', WORKER_AGAIN_SECONDS: '3',
  }
  let redis: Running | null = await startRedis(redisPort)
  const servers = ports.map((port, at) => startProcess('server/index.ts', { ...settings, PORT: String(port), BASE_URL: addresses[at]! }))
  const workers: Running[] = []
  for (const address of addresses) await until('the API answers', async () => (await fetch(`${address}/healthz`)).ok)
  const house = await buildWorkingHouse()

  afterAll(async () => {
    await Promise.all([...servers, ...workers].map((running) => running.stop()))
    await redis?.kill()
    await stripe.stop()
    await mail.stop()
  })

  return {
    house, mail, stripe, addresses,
    signIn: (person: { email: string }, api = 0) => signIn(addresses[api]!, person),
    startWorker: () => {
      const worker = startProcess('worker/index.ts', settings)
      workers.push(worker)
      return worker
    },
    killRedis: async () => { await redis?.kill(); redis = null },
    startRedis: async () => { redis = await startRedis(redisPort) },
    /** The mails that reached someone, by address. */
    mailsTo: (address: string) => mail.messages().filter(({ to }) => JSON.stringify(to).includes(address)),
  }
}

/** Holds a row so that a task stops in the middle of its work, until the returned function is called. */
export async function holdRow(sql: string): Promise<() => Promise<void>> {
  const transaction = await database.transaction()
  await database.query(sql, { transaction })
  return () => transaction.commit()
}

/** A worker waits for a lock in the database: it is in the middle of a task. */
export const someoneWaits = () => until('a worker waits for the held row', async () => {
  const [rows] = await database.query(`select 1 from pg_stat_activity where wait_event_type = 'Lock' and datname = current_database()`)
  return rows.length > 0
})

/** A mail is on its way: claimed, and not known to have arrived. */
export const someoneSends = () => until('a mail is being sent', async () => {
  const [rows] = await database.query(`select 1 from mails where state = 'sending'`)
  return rows.length > 0
})

/** As if the claims of dead workers were old, so that a test need not wait for that. */
export const ageClaims = () => database.query(`update mails set claimed_at = claimed_at - interval '10 minutes' where state = 'sending'`)
