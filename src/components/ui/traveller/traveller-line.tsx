import type { TravellerNode } from '../../../../shared/api/basics.ts'
import { classNames } from '../class-names.ts'
import { temperOf } from './temper.ts'
import { spokenState, travellerSummary } from './traveller-summary.ts'
import { travellerTime } from './traveller-time.ts'

/** A node of the API, with what only a screen knows. */
export type LineNode = TravellerNode & {
  /** On its way to another site by courier before this step. */
  courier?: boolean
  /** Planned after the due date. */
  late?: boolean
  /** Words instead of the time: "after answer", "current". */
  note?: string
}

/**
 * The traveller line. `xs` in queues, `s` in list rows: one image with a spoken summary. `m` on sheets and paper, `l` on a sample's
 * page: a list with labels, times and places. `onPhone`: how an `l` stands below 700 px. `samples`: how many share the line.
 * At most 14 nodes in a row.
 */
export function TravellerLine({ nodes, size = 's', samples, zone, onPhone, times = true, now, className }: {
  nodes: readonly LineNode[]
  size?: 'xs' | 's' | 'm' | 'l'
  samples?: number
  /** The site's time zone. */
  zone?: string
  onPhone?: 'upright' | 'fold'
  /** Whether m and l say times and places. */
  times?: boolean
  now?: Date
  className?: string
}) {
  if (size === 'xs' || size === 's') {
    return (
      <span role="img" aria-label={travellerSummary(nodes, samples)} className={classNames('tl', `tl-${size}`, className)}>
        {nodes.map((node, place) => <i key={place} className={nodeLook(node)} style={fill(node)} />)}
      </span>
    )
  }
  const phone = onPhone === 'upright' ? 'tl-upright' : onPhone === 'fold' && 'tl-fold'
  const tall = size === 'l' && nodes.length > 9 && nodes.some((node) => node.label.length > 11)
  return (
    <ol aria-label="Traveller" className={classNames('tl', `tl-${size}`, tall && 'tall', phone, className)}>
      {nodes.map((node, place) => {
        const time = node.note ?? (times ? travellerTime(node, { zone, now }) : undefined)
        return (
          <li key={place} className={nodeLook(node)} style={fill(node)} aria-current={node.state === 'now' ? 'step' : undefined}>
            <b>{node.label}</b>
            {time && <small>{time}</small>}
            {times && node.place && <small className="place">{node.place}</small>}
            <span className="sr-only">{spokenState(node)}</span>
          </li>
        )
      })}
    </ol>
  )
}

function nodeLook(node: LineNode): string {
  return classNames(`k-${node.kind}`, `c-${temperOf(node.stage)}`, `is-${node.state}`, node.courier && 'by-courier', node.late && 'is-late')
}

function fill(node: LineNode) {
  return node.state === 'part' ? { '--part': `${Math.round((node.part ?? 0) * 100)}%` } : undefined
}
