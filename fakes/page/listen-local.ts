import type { Server } from 'node:http'
import type { Express } from 'express'

export type Listening = {
  port: number
  /** Ends the server and every open connection. */
  close: () => Promise<void>
}

/** Listens on the loopback address only; port 0 takes a free one. */
export function listenLocal(app: Express, port: number): Promise<Listening> {
  return new Promise((resolve, reject) => {
    const server: Server = app.listen(port, '127.0.0.1', (error?: Error) => {
      if (error) return reject(error)
      const address = server.address()
      if (address === null || typeof address === 'string') return reject(new Error('the server has no port'))
      resolve({ port: address.port, close: () => close(server) })
    })
  })
}

function close(server: Server): Promise<void> {
  if (!server.listening) return Promise.resolve()
  return new Promise((resolve, reject) => {
    server.close((error) => (error ? reject(error) : resolve()))
    server.closeAllConnections()
  })
}
