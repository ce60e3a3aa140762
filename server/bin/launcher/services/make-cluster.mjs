import fs from 'node:fs'
import path from 'node:path'
import { run } from '../processes/run.mjs'
import { asAccount, ownedFolder } from './server-folders.mjs'

/**
 * Makes a database cluster with passwords for everyone, in a folder beside its place, and moves it there when it is whole:
 * one that a kill cut short is never mistaken for a cluster (initdb writes PG_VERSION early).
 */
export async function makeCluster(bin, folders, { superuser, password, safe = true }) {
  const draft = `${folders.postgres}.new`
  const passwordFile = path.join(folders.home, 'new-password')
  fs.rmSync(draft, { recursive: true, force: true })
  ownedFolder(draft, folders.account)
  fs.rmSync(passwordFile, { force: true })
  fs.writeFileSync(passwordFile, `${password}\n`, { mode: 0o600 })
  if (folders.account) fs.chownSync(passwordFile, folders.account.uid, folders.account.gid)
  const args = ['-D', draft, '-U', superuser, '-E', 'UTF8', '--locale=C.UTF-8', '-A', 'scram-sha-256', `--pwfile=${passwordFile}`, '--data-checksums']
  try {
    await run(path.join(bin, 'initdb'), safe ? args : [...args, '--no-sync'], asAccount(folders))
  } finally {
    fs.rmSync(passwordFile, { force: true })
  }
  fs.rmSync(folders.postgres, { recursive: true, force: true })
  fs.renameSync(draft, folders.postgres)
}
