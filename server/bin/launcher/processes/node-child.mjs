import fs from 'node:fs'
import { setTimeout as sleep } from 'node:timers/promises'
import { Failure } from '../failure.mjs'
import { interruption } from './interruption.mjs'
import { endOfLog, openLog } from '../data/logs.mjs'
import { signal, spawnGuarded } from './processes.mjs'
import { project } from '../data/project.mjs'

const START_PATIENCE_MS = 60_000
const MOMENT_MS = 700
const hasEnded = (child) => child.exitCode !== null || child.signalCode !== null

async function isHealthy(address) {
  try {
    const answer = await fetch(address, { signal: AbortSignal.timeout(2000) })
    await answer.arrayBuffer()
    return answer.ok
  } catch {
    return false
  }
}

/**
 * Starts one of the project's own programs with Node.js and comes back when `health` answers; without an address, when it has lived for a
 * moment. A program that ends before, or does not answer in time, is a Failure with the end of its log.
 */
export async function launchNode({ title, args, env, log, health, onSpawn, patienceMs = START_PATIENCE_MS }) {
  const output = openLog(log)
  const child = spawnGuarded(process.execPath, args, { cwd: project, env, deathSignal: 'SIGTERM', stdio: ['ignore', output, output] })
  fs.closeSync(output)
  let startFault = null
  child.on('error', (error) => { startFault = error.message })
  onSpawn(child)
  const began = Date.now()
  while (!startFault && !hasEnded(child)) {
    if (health ? await isHealthy(health) : Date.now() > began + MOMENT_MS) return child
    if (interruption.aborted || Date.now() > began + patienceMs) break
    await sleep(50)
  }
  const why = startFault ?? (hasEnded(child) ? `ended (${child.signalCode ?? `exit status ${child.exitCode}`})` : `gave no answer at ${health}`)
  if (child.pid && !hasEnded(child)) signal(child.pid, 'SIGKILL')
  throw new Failure(`${title} ${why}, see ${log}\n\n${endOfLog(log)}`)
}
