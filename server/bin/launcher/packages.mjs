import { createHash } from 'node:crypto'
import fs from 'node:fs'
import { freshLog } from './data/logs.mjs'
import { inProject, project } from './data/project.mjs'
import { recall, remember } from './data/remembered.mjs'
import { run } from './processes/run.mjs'

const readLock = (file) => JSON.parse(fs.readFileSync(file, 'utf8')).packages

/** npm writes its own list into node_modules as its last act, so a missing one also means an installation that was cut short. */
const installedList = inProject('node_modules', '.package-lock.json')

/** Whether node_modules holds what the lock file says: every package in that version, those for other machines excepted. */
function matchesLock() {
  const wanted = Object.entries(readLock(inProject('package-lock.json'))).filter(([name]) => name !== '')
  const present = readLock(installedList)
  return wanted.every(([name, { version, optional, link }]) => (name in present ? present[name].version === version : Boolean(optional || link)))
}

function isInstalled(hash) {
  if (!fs.existsSync(installedList)) return false
  if (recall('packages') === hash) return true
  return matchesLock()
}

/** npm as it runs us, else the one on the PATH. */
const npm = () => (process.env.npm_execpath?.endsWith('.js') ? [process.execPath, process.env.npm_execpath] : ['npm'])

/** Installs the packages of the lock file when they are missing or others; returns what was done. */
export async function ensurePackages() {
  const hash = createHash('sha256').update(fs.readFileSync(inProject('package-lock.json'))).digest('hex')
  const installed = isInstalled(hash)
  if (!installed) {
    const [file, ...args] = npm()
    await run(file, [...args, 'ci', '--include=dev', '--no-audit', '--no-fund'], { cwd: project, log: freshLog('npm') })
  }
  remember('packages', hash)
  return installed ? 'present' : 'installed'
}
