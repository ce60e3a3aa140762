import net from 'node:net'
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

export const anyFreePort = () => tryPort(0, '127.0.0.1')

/**
 * Ports for the named parts: the one the person asked for, else the one of the last start, else the preferred one, else any;
 * always one that is free now.
 */
export async function choosePorts(wanted) {
  const last = recall('ports') ?? {}
  const ports = {}
  for (const { name, preferred, asked } of wanted) {
    if (asked !== undefined) {
      const port = Number(asked)
      if (!Number.isInteger(port) || port < 1 || port > 65535) throw new Failure(`PORT must be a whole number from 1 to 65535, not "${asked}".`)
      if (!(await isFree(port))) throw new Failure(`Port ${port} (from PORT) is in use or not allowed. Choose another, or leave PORT out.`)
      ports[name] = port
      continue
    }
    for (const port of [last[name], preferred]) if (!ports[name] && port && !Object.values(ports).includes(port) && (await isFree(port))) ports[name] = port
    while (!ports[name] || Object.entries(ports).some(([other, port]) => other !== name && port === ports[name])) ports[name] = await anyFreePort()
  }
  remember('ports', { ...last, ...ports })
  return ports
}
