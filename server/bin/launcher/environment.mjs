import { pathToFileURL } from 'node:url'
import { inData } from './data/project.mjs'
import { secret } from './data/secrets.mjs'

/** The parts that `npm start` brings along, and the variables that put something of one's own in their place. */
export const parts = {
  postgres: ['DATABASE_URL'],
  redis: ['REDIS_URL'],
  stripe: ['STRIPE_SECRET_KEY', 'STRIPE_API_BASE'],
  mail: ['SMTP_URL'],
}

/** Variables that must be set too once a part is replaced. */
const required = { stripe: ['STRIPE_SECRET_KEY', 'STRIPE_WEBHOOK_SECRET'] }

const everyone = ['api', 'worker', 'migrate', 'seed']
const local = (port) => `http://127.0.0.1:${port}`

/**
 * Every variable of the product: its name, who receives it, and what it is when the person has not set it. `own` is what this
 * launcher provides: `own.dev`, `own.ports`, and `own.postgres`, `own.redis`, `own.stripe`, `own.mail` for those parts that are embedded.
 */
const variables = [
  ['NODE_ENV', everyone, (own) => (own.dev ? 'development' : 'production')],
  ['CROSSHEAD_DEMO', everyone, (own) => (own.postgres ? '1' : undefined)],
  ['DATABASE_URL', everyone, (own) => own.postgres.appUrl],
  ['DATABASE_OWNER_URL', ['migrate', 'seed'], (own) => own.postgres?.ownerUrl ?? given('DATABASE_URL')],
  ['REDIS_URL', everyone, (own) => own.redis.url],
  ['PORT', everyone, (own) => String(own.ports.api)],
  ['HOST', everyone, () => '127.0.0.1'],
  ['BASE_URL', everyone, (own) => `http://localhost:${own.dev ? own.ports.web : own.ports.api}`],
  ['STRIPE_API_BASE', everyone, (own) => own.stripe && local(own.ports.stripe)],
  ['STRIPE_SECRET_KEY', everyone, () => `sk_test_${secret('stripe-key')}`],
  ['STRIPE_WEBHOOK_SECRET', everyone, () => `whsec_${secret('stripe-webhooks')}`],
  ['SMTP_URL', everyone, (own) => `smtp://127.0.0.1:${own.ports.smtp}`],
  ['MAIL_FROM', everyone, () => 'Crosshead <no-reply@crosshead.example>'],
  ['MAIL_PAGE_URL', everyone, (own) => own.mail && local(own.ports.mail)],
  ['FILES_URL', everyone, () => pathToFileURL(inData('files')).href],
  ['SESSION_SECRET', everyone, () => secret('session')],
  ['REPORT_CODE_SECRET', everyone, () => secret('report-codes')],
]

/** What the stand-ins for outside services receive. */
const fakeVariables = {
  stripe: (own) => ({
    PORT: String(own.ports.stripe),
    WEBHOOK_URL: `${local(own.ports.api)}/api/payments/notices`,
    STRIPE_SECRET_KEY: valueOf('STRIPE_SECRET_KEY', own),
    STRIPE_WEBHOOK_SECRET: valueOf('STRIPE_WEBHOOK_SECRET', own),
    STATE_FILE: inData('stripe.json'),
  }),
  mail: (own) => ({ PORT: String(own.ports.mail), SMTP_PORT: String(own.ports.smtp), STATE_DIR: inData('mail') }),
}

/** What the person has set; an empty variable counts as not set. */
export const given = (name) => process.env[name]?.trim() || undefined

export const isEmbedded = (part) => !parts[part].some(given)

/** The first variable that is missing beside those that replace a part, as a sentence; undefined when all is there. */
export function missingVariable() {
  for (const [part, names] of Object.entries(required)) {
    const set = parts[part].find(given)
    const missing = names.find((name) => !given(name))
    if (set && missing) return `${set} is set, so ${missing} is needed too.`
  }
  return undefined
}

export function valueOf(name, own) {
  const [, , value] = variables.find(([each]) => each === name)
  return given(name) ?? value(own) ?? undefined
}

/** The person's own environment without npm's additions and without any variable of the product. */
function plainEnvironment() {
  const ours = new Set(variables.map(([name]) => name))
  return Object.fromEntries(Object.entries(process.env).filter(([name]) => !ours.has(name) && !name.startsWith('npm_')))
}

export function environmentOf(reader, own) {
  const values = variables.filter(([, readers]) => readers.includes(reader)).map(([name]) => [name, valueOf(name, own)])
  return { ...plainEnvironment(), ...Object.fromEntries(values.filter(([, value]) => value !== undefined)) }
}

export const fakeEnvironment = (fake, own) => ({ ...plainEnvironment(), NODE_ENV: own.dev ? 'development' : 'production', ...fakeVariables[fake](own) })
