import { createServer } from 'node:http'
import type { AddressInfo } from 'node:net'

export type ReceivedNotice = { body: Buffer; signature: string }

/** Collects what the payment stand-in sends and answers with the given statuses in turn, then with 200. */
export async function startNoticeReceiver(statuses: number[] = []) {
  const notices: ReceivedNotice[] = []
  const server = createServer((req, res) => {
    const chunks: Buffer[] = []
    req.on('data', (chunk: Buffer) => chunks.push(chunk))
    req.on('end', () => {
      notices.push({ body: Buffer.concat(chunks), signature: String(req.headers['stripe-signature']) })
      res.writeHead(statuses.shift() ?? 200).end()
    })
  })
  await new Promise<void>((resolve) => server.listen(0, '127.0.0.1', resolve))
  const { port } = server.address() as AddressInfo
  return {
    url: `http://127.0.0.1:${port}/notices`,
    notices,
    types: () => notices.map((notice) => (JSON.parse(notice.body.toString()) as { type: string }).type),
    stop: () => new Promise((resolve) => { server.close(resolve); server.closeAllConnections() }),
  }
}
