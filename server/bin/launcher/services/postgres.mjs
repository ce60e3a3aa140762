import fs from 'node:fs'
import path from 'node:path'
import { setTimeout as sleep } from 'node:timers/promises'
import { Failure } from '../failure.mjs'
import { endOfLog, openLog } from '../data/logs.mjs'
import { endProcesses, isAlive, processesIn, signal, spawnGuarded } from '../processes/processes.mjs'
import { findPostgres } from './system-programs.mjs'
import { asAccount } from './server-folders.mjs'

const START_PATIENCE_MS = 180_000 // recovery after a crash may read much

export const hasCluster = (folder) => fs.existsSync(path.join(folder, 'PG_VERSION'))

/** The programs that fit the cluster: data of one major version are not read by another. */
export function programsFor(folder) {
  const installed = findPostgres()
  if (!hasCluster(folder)) return installed[0].folder
  const version = Number(fs.readFileSync(path.join(folder, 'PG_VERSION'), 'utf8'))
  const fitting = installed.find((each) => each.version === version)
  if (fitting) return fitting.folder
  throw new Failure(`${folder} was made by PostgreSQL ${version}, and installed is ${installed.map((each) => each.version).join(', ')}. Install postgresql-${version}, or move .data away to begin anew.`)
}

function postmasterOf(folder) {
  try {
    const lines = fs.readFileSync(path.join(folder, 'postmaster.pid'), 'utf8').split('\n')
    return { pid: Number(lines[0]), isReady: lines[7]?.trim() === 'ready' }
  } catch {
    return null
  }
}

/**
 * Clears the way for a start: ends a postmaster that outlived its launcher, waits for the backends of a killed one, and
 * removes its pid file. A pid alone proves nothing (reused, or a zombie that PostgreSQL would take for alive): what counts is which live
 * process has this folder as its working directory.
 */
export async function endPostgresIn(folder) {
  const leftovers = processesIn(folder, 'postgres')
  const pid = postmasterOf(folder)?.pid
  if (leftovers.includes(pid)) await endProcesses([pid], 'SIGINT', 20_000)
  for (const until = Date.now() + 5000; processesIn(folder, 'postgres').length > 0 && Date.now() < until;) await sleep(50)
  await endProcesses(processesIn(folder, 'postgres'), 'SIGTERM', 2000)
  fs.rmSync(path.join(folder, 'postmaster.pid'), { force: true })
}

/** Starts the cluster on loopback, without a socket file, and comes back when it takes connections. */
export async function startPostgres(bin, folders, { port, log, settings = [], onSpawn = () => {} }) {
  const folder = folders.postgres
  await endPostgresIn(folder)
  const all = [`port=${port}`, 'listen_addresses=127.0.0.1', 'unix_socket_directories=', 'max_connections=100', 'timezone=UTC', 'log_timezone=UTC', ...settings]
  const output = openLog(log)
  const child = spawnGuarded(path.join(bin, 'postgres'), ['-D', folder, ...all.flatMap((setting) => ['-c', setting])], {
    ...asAccount(folders),
    deathSignal: 'SIGINT', // a fast and clean shutdown
    stdio: ['ignore', output, output],
  })
  fs.closeSync(output)
  onSpawn(child)
  let startFault = null
  child.on('error', (error) => { startFault = error.message })
  for (const until = Date.now() + START_PATIENCE_MS; Date.now() < until && !startFault && isAlive(child.pid) && child.exitCode === null;) {
    const postmaster = postmasterOf(folder)
    if (postmaster?.pid === child.pid && postmaster.isReady) return child
    await sleep(10)
  }
  if (child.pid && isAlive(child.pid)) signal(child.pid, 'SIGQUIT')
  throw new Failure(`PostgreSQL did not start${startFault ? ` (${startFault})` : ''}, see ${log}\n\n${endOfLog(log)}`)
}
