import { spawn, spawnSync } from 'node:child_process'
import fs from 'node:fs'
import { setTimeout as sleep } from 'node:timers/promises'

function readProc(pid, name) {
  try {
    return fs.readFileSync(`/proc/${pid}/${name}`, 'utf8')
  } catch {
    return ''
  }
}

function workingFolder(pid) {
  try {
    return fs.readlinkSync(`/proc/${pid}/cwd`)
  } catch {
    return ''
  }
}

/** State, group and start time (ticks since boot) from /proc/PID/stat; null when there is no such process. */
function statOf(pid) {
  const stat = readProc(pid, 'stat')
  if (!stat) return null
  const fields = stat.slice(stat.lastIndexOf(')') + 2).split(' ') // the name before it may hold blanks and brackets
  return { state: fields[0], group: Number(fields[2]), startedAt: fields[19] }
}

/** A zombie counts as dead: it only waits to be collected, though `kill(pid, 0)` still finds it. */
export function isAlive(pid) {
  if (!pid) return false
  if (fs.existsSync('/proc/self/stat')) return !['Z', 'X', undefined].includes(statOf(pid)?.state)
  try {
    process.kill(pid, 0)
    return true
  } catch (error) {
    return error.code === 'EPERM'
  }
}

/** What has to be noted to know this very process again: pids are reused. */
export const identify = (pid, hint) => ({ pid, startedAt: statOf(pid)?.startedAt, folder: workingFolder(pid), hint })

const isIn = (pid, { folder, hint }) => workingFolder(pid) === folder && readProc(pid, 'cmdline').includes(hint)

const allPids = () => (fs.existsSync('/proc') ? fs.readdirSync('/proc').filter((name) => /^\d+$/.test(name)).map(Number) : [])

/** Whether the noted process still runs: same pid, same start, same folder, and its command line holds the hint. */
export const isSame = (noted) => Boolean(noted?.startedAt) && isAlive(noted.pid) && statOf(noted.pid)?.startedAt === noted.startedAt && isIn(noted.pid, noted)

/** The noted process and what it left in its process group, as far as they are surely the noted ones. */
export function remainsOf(noted) {
  if (!noted?.startedAt) return []
  return allPids().filter((pid) => isAlive(pid) && (pid === noted.pid ? isSame(noted) : statOf(pid)?.group === noted.pid && isIn(pid, noted)))
}

/** Live processes of that name working in that folder, whoever started them: servers move into their data folder. */
export function processesIn(folder, name) {
  if (!fs.existsSync(folder)) return []
  const real = fs.realpathSync(folder)
  return allPids().filter((pid) => workingFolder(pid) === real && readProc(pid, 'comm').startsWith(name) && isAlive(pid))
}

export function signal(pid, name) {
  try {
    process.kill(pid, name)
  } catch (error) {
    if (error.code !== 'ESRCH') throw error
  }
}

/** Asks processes to end, waits, and kills those that do not. */
export async function endProcesses(pids, name, patienceMs) {
  for (const pid of pids) signal(pid, name)
  for (const until = Date.now() + patienceMs; pids.some(isAlive) && Date.now() < until;) await sleep(20)
  for (const pid of pids.filter(isAlive)) signal(pid, 'SIGKILL')
  while (pids.some(isAlive)) await sleep(20)
}

let canGuard
const guards = () => (canGuard ??= spawnSync('setpriv', ['--pdeathsig', 'TERM', 'true']).status === 0)

/**
 * Starts a process in a session of its own, so that Ctrl-C in the terminal reaches only us and we stop things in order.
 * Where `setpriv` (util-linux) is present the kernel sends it `deathSignal` when we die, even by `kill -9`.
 */
export function spawnGuarded(file, args, { deathSignal, ...options }) {
  const command = guards() ? ['setpriv', '--pdeathsig', deathSignal.replace(/^SIG/, ''), file, ...args] : [file, ...args]
  return spawn(command[0], command.slice(1), { ...options, detached: true })
}
