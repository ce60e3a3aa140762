import net from 'node:net'
import { setTimeout as sleep } from 'node:timers/promises'
import { Failure } from '../failure.mjs'
import { recall, remember } from '../data/remembered.mjs'

function tryPort(port, host) {
  return new Promise((resolve) => {
    const server = net.createServer()
    server.on('error', () => resolve(0))
    server.listen({ port, host, exclusive: true }, () => {
      const taken = server.address().port
      server.close(() => resolve(taken))
    })
  })
}

/** Free on loopback and not held by a process that listens on all addresses. */
export const isFree = async (port) => Boolean((await tryPort(port, '127.0.0.1')) && (await tryPort(port)))

/** A port of before: a process that has just been killed may hold it for a moment longer. */
async function isFreeSoon(port) {
  for (let attempt = 0; attempt < 10; attempt++) {
    if (await isFree(port)) return true
    await sleep(100)
  }
  return false
}

export const anyFreePort = () => tryPort(0, '127.0.0.1')

function portOf(text) {
  const port = Number(text)
  if (!Number.isInteger(port) || port < 1 || port > 65535) throw new Failure(`PORT must be a whole number from 1 to 65535, not "${text}".`)
  return port
}

async function choosePort({ preferred, asked, last, taken }) {
  if (asked !== undefined) {
    const port = portOf(asked)
    if (await isFreeSoon(port)) return port
    throw new Failure(`Port ${port} (from PORT) is in use or not allowed. Choose another, or leave PORT out.`)
  }
  if (last && !taken.includes(last) && (await isFreeSoon(last))) return last
  if (!taken.includes(preferred) && (await isFree(preferred))) return preferred
  for (;;) {
    const port = await anyFreePort()
    if (!taken.includes(port)) return port
  }
}

/**
 * Ports for the named parts: the one the person asked for, else the one of the last start, else the preferred one, else any; always
 * one that is free now.
 */
export async function choosePorts(wanted) {
  const before = recall('ports') ?? {}
  const ports = {}
  for (const { name, preferred, asked } of wanted) {
    ports[name] = await choosePort({ preferred, asked, last: before[name], taken: Object.values(ports) })
  }
  const own = wanted.filter(({ asked }) => asked === undefined).map(({ name }) => [name, ports[name]])
  remember('ports', { ...before, ...Object.fromEntries(own) })
  return ports
}
