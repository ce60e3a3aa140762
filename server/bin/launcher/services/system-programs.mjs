import { spawnSync } from 'node:child_process'
import fs from 'node:fs'
import path from 'node:path'
import { Failure } from '../failure.mjs'
import { freshLog } from '../data/logs.mjs'
import { lastLines, run } from '../processes/run.mjs'

const OLDEST_POSTGRES = 15

const isProgram = (file) => {
  try {
    fs.accessSync(file, fs.constants.X_OK)
    return true
  } catch {
    return false
  }
}

// Servers live in sbin on some systems, which is not on everyone's PATH.
const searchPath = () => [...(process.env.PATH ?? '').split(':').filter(Boolean), '/usr/local/bin', '/usr/bin', '/bin', '/usr/sbin']

export const findProgram = (name) => searchPath().map((folder) => path.join(folder, name)).find(isProgram)

function versionOf(folder) {
  const { stdout } = spawnSync(path.join(folder, 'postgres'), ['--version'], { encoding: 'utf8' })
  return Number(/(\d+)/.exec(stdout ?? '')?.[1] ?? 0)
}

/** Folders with PostgreSQL servers, newest first: Debian keeps one per version, off the PATH. */
export function findPostgres() {
  const base = '/usr/lib/postgresql'
  const debian = fs.existsSync(base) ? fs.readdirSync(base).map((version) => path.join(base, version, 'bin')) : []
  return [...new Set([...debian, ...searchPath()])]
    .filter((folder) => isProgram(path.join(folder, 'postgres')) && isProgram(path.join(folder, 'initdb')))
    .map((folder) => ({ folder, version: versionOf(folder) }))
    .filter(({ version }) => version >= OLDEST_POSTGRES)
    .sort((a, b) => b.version - a.version)
}

/** What we may need from the system: how to find it, and the Debian package that has it. */
const programs = {
  postgresql: { title: `PostgreSQL ${OLDEST_POSTGRES} or newer`, isThere: () => findPostgres().length > 0 },
  'redis-server': { title: 'redis-server', isThere: () => Boolean(findProgram('redis-server')) },
  chromium: { title: 'Chromium', isThere: () => Boolean(findProgram('chromium')) },
  'poppler-utils': { title: 'poppler-utils (pdftotext, pdfinfo, pdfsig)', isThere: () => Boolean(findProgram('pdftotext')) },
}

const missing = (names) => names.filter((name) => !programs[name].isThere())

/** Finds the Debian packages named, installs them as root, and otherwise says the one line to type; returns what was done. */
export async function ensurePrograms(names) {
  const wanted = missing(names)
  if (wanted.length === 0) return 'present'
  const titles = wanted.map((name) => programs[name].title).join(', ')
  if (process.getuid() !== 0 || !findProgram('apt-get')) {
    const asRoot = process.getuid() === 0 ? '' : 'sudo '
    throw new Failure(`Missing: ${titles}. Install it with this line and start again:\n\n  ${asRoot}apt-get update && ${asRoot}apt-get install -y ${wanted.join(' ')}\n`)
  }
  const log = freshLog('apt')
  const env = { ...process.env, DEBIAN_FRONTEND: 'noninteractive', LC_ALL: 'C.UTF-8' }
  const lockWait = ['-o', 'DPkg::Lock::Timeout=300']
  const update = await run('apt-get', [...lockWait, 'update'], { env, log, mayFail: true }) // old lists may still do
  const install = await run('apt-get', [...lockWait, 'install', '-y', '--no-install-recommends', ...wanted], { env, log, mayFail: true })
  if (install.status !== 0) {
    throw new Failure(`apt-get could not install ${wanted.join(' and ')}, see ${log}\n\n${lastLines(update.stderr, 6)}\n${lastLines(install.stderr, 10)}`)
  }
  const still = missing(wanted)
  if (still.length > 0) throw new Failure(`Debian's ${still.join(' and ')} is installed, yet ${still.map((name) => programs[name].title).join(', ')} is not found.`)
  return `installed ${wanted.join(', ')}`
}
