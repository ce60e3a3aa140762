import { migrate } from '../database/migrate.ts'

const appUrl = process.env.DATABASE_URL
if (!appUrl) throw new Error('DATABASE_URL is missing')
const ran = await migrate(process.env.DATABASE_OWNER_URL ?? appUrl, appUrl)
console.log(ran.length === 0 ? 'nothing to migrate' : `migrated: ${ran.join(', ')}`)
