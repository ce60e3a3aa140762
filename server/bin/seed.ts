import { database } from '../database/connection.ts'
import { demoPassword, people } from '../database/seeds/demo-people.ts'
import { makeDemo } from '../database/seeds/make-demo.ts'

if (process.env.NODE_ENV === 'production' && process.env.CROSSHEAD_DEMO !== '1' && process.env.CROSSHEAD_DEMO !== 'true') {
  throw new Error('the demonstration is not made in production unless CROSSHEAD_DEMO=1 asks for it')
}
await makeDemo()
console.log(JSON.stringify({ accounts: people.map(({ email, what }) => ({ email, password: demoPassword, what })) }))
await database.close()
