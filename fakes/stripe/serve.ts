import * as z from 'zod'
import { startFakeStripe } from './create-fake-stripe.ts'

const Environment = z.object({
  PORT: z.coerce.number().int().min(0).max(65535),
  WEBHOOK_URL: z.url(),
  STRIPE_SECRET_KEY: z.string().min(1),
  STRIPE_WEBHOOK_SECRET: z.string().min(1),
  STATE_FILE: z.string().min(1).optional(),
  PUBLIC_URL: z.url().optional(),
})

const env = Environment.safeParse(process.env)
if (!env.success) throw new Error(`fakes/stripe: ${z.prettifyError(env.error)}`)

const fake = await startFakeStripe({
  port: env.data.PORT,
  webhookUrl: env.data.WEBHOOK_URL,
  secretKey: env.data.STRIPE_SECRET_KEY,
  // The receiver may know several while they are rotated; the first one signs.
  webhookSecret: env.data.STRIPE_WEBHOOK_SECRET.split(',')[0]?.trim() ?? '',
  stateFile: env.data.STATE_FILE,
  publicUrl: env.data.PUBLIC_URL?.replace(/\/+$/, ''),
})
process.stdout.write(`payment stand-in at ${fake.url}\n`)

const stop = () => void fake.stop().then(() => process.exit(0))
process.once('SIGTERM', stop)
process.once('SIGINT', stop)
