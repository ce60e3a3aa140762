import type { TravellerNode } from '../../../../shared/api/basics.ts'
import { formatDay, formatTime, formatWhen, isSameDay, type Manner } from '../../../lib/format.ts'

/** The time under a node: "since 10:31" while it goes on, the hour when it is today, the day alone where the hour says nothing. */
export function travellerTime(node: TravellerNode, { now = new Date(), ...manner }: Manner & { now?: Date | undefined } = {}): string | undefined {
  if (node.state === 'void') return undefined
  if (!node.at) return node.state === 'held' ? 'on hold' : undefined
  const today = isSameDay(node.at, now, manner.zone)
  const since = today ? formatTime(node.at, manner) : formatDay(node.at, 'short', manner)
  if (node.state === 'now') return `since ${since}`
  if (node.state === 'held') return `on hold since ${since}`
  if (node.kind !== 'prep' && node.kind !== 'test') return formatDay(node.at, 'short', manner)
  return today ? formatTime(node.at, manner) : formatWhen(node.at, 'short', manner)
}
