import * as z from 'zod'
import { startFakeMail } from './create-fake-mail.ts'

const Port = z.coerce.number().int().min(0).max(65535)
const Environment = z.object({ SMTP_PORT: Port, PORT: Port, STATE_DIR: z.string().min(1).optional() })

const env = Environment.safeParse(process.env)
if (!env.success) throw new Error(`fakes/mail: ${z.prettifyError(env.error)}`)

const fake = await startFakeMail({ smtpPort: env.data.SMTP_PORT, pagePort: env.data.PORT, stateDir: env.data.STATE_DIR })
process.stdout.write(`mail stand-in at ${fake.smtpUrl}, its page at ${fake.pageUrl}\n`)

const stop = () => void fake.stop().then(() => process.exit(0))
process.once('SIGTERM', stop)
process.once('SIGINT', stop)
