import { database } from '../database/connection.ts'
import { demoPassword, people } from '../database/seeds/demo-people.ts'
import { makeDemo } from '../database/seeds/make-demo.ts'
import { createIntegrations } from '../integrations/create-integrations.ts'
import { closeLimits } from '../integrations/limits/limits.ts'
import { setOutside } from '../integrations/outside.ts'
import { readSettings } from '../integrations/settings.ts'

if (process.env.NODE_ENV === 'production' && process.env.CROSSHEAD_DEMO !== '1' && process.env.CROSSHEAD_DEMO !== 'true') {
  throw new Error('the demonstration is not made in production unless CROSSHEAD_DEMO=1 asks for it')
}
const settings = readSettings()
const integrations = createIntegrations(settings)
setOutside({ ...integrations, settings })
await makeDemo()
console.log(JSON.stringify({ accounts: people.map(({ email, what }) => ({ email, password: demoPassword, what })) }))
closeLimits()
integrations.mail.close()
await database.close()
