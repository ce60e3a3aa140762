import fs from 'node:fs'
import path from 'node:path'
import { Failure } from '../failure.mjs'

function accounts() {
  return fs.readFileSync('/etc/passwd', 'utf8').split('\n').filter(Boolean).map((line) => {
    const [name, , uid, gid] = line.split(':')
    return { name, uid: Number(uid), gid: Number(gid) }
  })
}

/**
 * The account that runs the servers; null for our own. PostgreSQL refuses to run as root, so root hands them to the owner of the
 * cluster that is there already, else to `postgres`, which Debian's package makes.
 */
export function serverAccount(clusterFolder) {
  if (process.getuid() !== 0) return null
  const owner = fs.existsSync(clusterFolder) ? fs.statSync(clusterFolder).uid : 0
  const account = accounts().find(({ uid, name }) => (owner === 0 ? name === 'postgres' : uid === owner))
  if (!account) throw new Failure('PostgreSQL does not run as root, and there is no account "postgres". Debian\'s package postgresql makes it.')
  return account
}

/** The first folder on the way that the account may not walk through; null when the way is free. */
export function blockedAt(folder, account) {
  if (!account) return null
  const parts = path.resolve(folder).split('/')
  for (let count = 1; count <= parts.length; count++) {
    const part = parts.slice(0, count).join('/') || '/'
    if (!fs.existsSync(part)) break
    const { uid, gid, mode } = fs.statSync(part)
    const bit = uid === account.uid ? 0o100 : gid === account.gid ? 0o010 : 0o001
    if (!(mode & bit)) return part
  }
  return null
}
