import fs from 'node:fs'
import path from 'node:path'
import { blockedAt, serverAccount } from './account.mjs'

/** A folder that the server's account owns and nobody else reads. */
export function ownedFolder(folder, account) {
  fs.mkdirSync(folder, { recursive: true, mode: 0o700 })
  fs.chmodSync(folder, 0o700)
  if (account) fs.chownSync(folder, account.uid, account.gid)
  return folder
}

/**
 * Where the servers keep their files: in `base`, unless their account cannot walk there (a checkout below a 0700 home); then
 * in `fallback` below /var/lib.
 */
export function serverFolders(base, fallback) {
  const intended = serverAccount(path.join(base, 'postgres'))
  fs.mkdirSync(base, { recursive: true })
  fs.chmodSync(base, intended ? 0o711 : 0o700) // others may walk through to their own folder, and see nothing
  const blocked = blockedAt(base, intended)
  const home = blocked ? fallback : base
  if (blocked) {
    fs.mkdirSync(home, { recursive: true })
    fs.chmodSync(home, 0o711)
  }
  const account = blocked ? serverAccount(path.join(home, 'postgres')) : intended
  return {
    home,
    account,
    postgres: path.join(home, 'postgres'),
    redis: path.join(home, 'redis'),
    note: blocked ? `${account.name} may not enter ${blocked}; the servers keep their files in ${home}` : '',
  }
}

/** Options for a process that runs as the server's account, with nothing of our own environment but the PATH. */
export function asAccount({ account, home }) {
  const options = { cwd: home, env: { PATH: process.env.PATH, LANG: 'C.UTF-8', LC_ALL: 'C.UTF-8', TZ: 'UTC' } }
  return account ? { ...options, uid: account.uid, gid: account.gid } : options
}
