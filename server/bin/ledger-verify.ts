import { database } from '../database/connection.ts'
import { verifyLedger } from '../services/ledger/verify-ledger.ts'

const { events, broken } = await verifyLedger()
console.log(broken ? `broken at event ${broken.id}: ${broken.why} (${events} events before it are whole)` : `${events} events, the chain is whole`)
await database.close()
process.exitCode = broken ? 1 : 0
