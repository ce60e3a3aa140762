import { isIPv6 } from 'node:net'
import type { Request } from 'express'

/** Where a request comes from, as limits count it: an IPv4 address, or the /64 network that one IPv6 user has to themselves. */
export function addressOf(req: Request): string {
  const address = (req.ip ?? 'unknown').replace(/^::ffff:(?=\d+\.)/i, '')
  return isIPv6(address) ? network64(address) : address
}

function network64(address: string): string {
  const [head = '', tail = ''] = address.split('%', 1)[0]?.split('::') ?? []
  const front = head.split(':').filter(Boolean)
  const back = tail.split(':').filter(Boolean)
  const groups = address.includes('::') ? [...front, ...Array<string>(Math.max(0, 8 - front.length - back.length)).fill('0'), ...back] : front
  return `${groups.slice(0, 4).map((group) => Number.parseInt(group, 16).toString(16)).join(':')}::/64`
}
