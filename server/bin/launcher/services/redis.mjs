import fs from 'node:fs'
import net from 'node:net'
import path from 'node:path'
import { setTimeout as sleep } from 'node:timers/promises'
import { Failure } from '../failure.mjs'
import { endOfLog, openLog } from '../data/logs.mjs'
import { endProcesses, isAlive, processesIn, signal, spawnGuarded } from '../processes/processes.mjs'
import { findProgram } from './system-programs.mjs'
import { asAccount, ownedFolder } from './server-folders.mjs'

const START_PATIENCE_MS = 60_000

export const redisUrl = (password, port) => `redis://:${password}@127.0.0.1:${port}/0`

/** One PING with the password; false until the data are loaded. */
function answers(port, password) {
  return new Promise((resolve) => {
    const socket = net.connect(port, '127.0.0.1', () => socket.write(`AUTH ${password}\r\nPING\r\n`))
    let heard = ''
    const finish = (result) => {
      socket.destroy()
      resolve(result)
    }
    socket.setTimeout(1000, () => finish(false))
    socket.on('error', () => finish(false))
    socket.on('close', () => finish(false))
    socket.on('data', (data) => {
      heard += data.toString()
      if (heard.includes('+PONG')) finish(true)
      else if (heard.split('\r\n').length > 2) finish(false)
    })
  })
}

/** Ends a Redis that outlived its launcher. */
export const endRedisIn = (folder) => endProcesses(processesIn(folder, 'redis-server'), 'SIGTERM', 10_000)

/** Starts Redis on loopback with a password and comes back when it answers. `keep`: write every change to disk. */
export async function startRedis(folders, { port, password, log, keep = true, onSpawn = () => {} }) {
  const folder = ownedFolder(folders.redis, folders.account)
  await endRedisIn(folder)
  // In a file, since a command line can be read by everyone on the machine.
  const configuration = path.join(folder, 'redis.conf')
  const lines = [
    'bind 127.0.0.1', `port ${port}`, `requirepass ${password}`, `dir "${folder}"`, 'daemonize no', 'save ""',
    `appendonly ${keep ? 'yes' : 'no'}`, 'appendfsync everysec', 'maxmemory-policy noeviction', // a queue must never lose a key to make room
  ]
  fs.rmSync(configuration, { force: true })
  fs.writeFileSync(configuration, `${lines.join('\n')}\n`, { mode: 0o600 })
  if (folders.account) fs.chownSync(configuration, folders.account.uid, folders.account.gid)

  const output = openLog(log)
  const child = spawnGuarded(findProgram('redis-server'), [configuration], { ...asAccount(folders), deathSignal: 'SIGTERM', stdio: ['ignore', output, output] })
  fs.closeSync(output)
  onSpawn(child)
  let startFault = null
  child.on('error', (error) => { startFault = error.message })
  for (const until = Date.now() + START_PATIENCE_MS; Date.now() < until && !startFault && isAlive(child.pid) && child.exitCode === null;) {
    if (await answers(port, password)) return child
    await sleep(10)
  }
  if (child.pid && isAlive(child.pid)) signal(child.pid, 'SIGKILL')
  throw new Failure(`Redis did not start${startFault ? ` (${startFault})` : ''}, see ${log}\n\n${endOfLog(log)}`)
}
