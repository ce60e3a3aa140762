import type { TravellerNode } from '../../../../shared/api/basics.ts'

const states: Record<TravellerNode['state'], string> = { todo: 'to come', now: 'now', done: 'done', part: 'in part', held: 'on hold', void: 'void', back: 'sent back' }

/** The state of one node, as it is spoken. */
export function spokenState(node: Pick<TravellerNode, 'state' | 'part'>): string {
  return node.state === 'part' ? `${percent(node)} done` : states[node.state]
}

/** The whole line in a sentence: "Traveller: 4 of 8 done, now pull", "Traveller of 40 samples: section 75 %, machine 50 %". */
export function travellerSummary(nodes: readonly TravellerNode[], samples?: number): string {
  const start = samples && samples > 1 ? `Traveller of ${samples} samples` : 'Traveller'
  if (nodes.length === 0) return `${start}: no steps yet`
  const live = nodes.filter((node) => node.state !== 'void')
  if (live.length <= 1 && nodes.length > 1) return `${start}: void`
  const said = live.flatMap((node) => {
    if (node.state === 'part') return [`${node.label} ${percent(node)}`]
    if (node.state === 'held') return [`on hold before ${node.label}`]
    if (node.state === 'back') return [`${node.label} sent back`]
    if (node.state === 'now') return [`now ${node.label}`]
    return []
  })
  const done = live.filter((node) => node.state === 'done').length
  return `${start}: ${[`${done} of ${live.length} done`, ...said].join(', ')}`
}

function percent(node: Pick<TravellerNode, 'part'>): string {
  return `${Math.round((node.part ?? 0) * 100)} %`
}
