import { useEffect, useRef, type KeyboardEvent, type PointerEvent } from 'react'
import { checkEntry } from '../../../shared/method/check-entry.ts'
import type { Plane } from '../../components/ui/pictures/plane.ts'
import type { SheetViewProps } from '../sheet-view.ts'

const path = 'parameters.elasticWindow'
const pauseMs = 700
/** The two ends stay this far apart, MPa. */
const least = 5

/** The window of the elastic fit, held by two grips: dragged, or moved by 10 MPa with the arrows, by 1 MPa with Shift. It is kept when it rests. */
export function ElasticGrips({ sheet, fromMPa, toMPa, points, drawn: { x, y, width, margins }, most }: { sheet: SheetViewProps; fromMPa: number; toMPa: number; points: number; drawn: Plane; most: number }) {
  const { typed, type, keep, locked, method } = sheet
  const dragged = useRef<'from' | 'to' | null>(null)
  const timer = useRef<ReturnType<typeof setTimeout>>(undefined)
  useEffect(() => () => clearTimeout(timer.current), [])
  const half = typed[path] ? (JSON.parse(typed[path]) as { fromMPa: number; toMPa: number }) : undefined
  const ends = half ?? { fromMPa: Math.round(fromMPa), toMPa: Math.round(toMPa) }
  const latest = useRef(ends)
  useEffect(() => { latest.current = ends })

  const move = (which: 'from' | 'to', mpa: number) => {
    const to = Math.round(Math.min(most, Math.max(0, mpa)))
    const next = which === 'from' ? { ...latest.current, fromMPa: Math.min(to, latest.current.toMPa - least) } : { ...latest.current, toMPa: Math.max(to, latest.current.fromMPa + least) }
    latest.current = next
    type({ [path]: JSON.stringify(next) })
  }
  const rest = () => {
    clearTimeout(timer.current)
    if (checkEntry(method, path, latest.current) !== null) return
    keep([{ path, value: latest.current }])
    type({ [path]: '' })
  }
  const keys = (which: 'from' | 'to') => (event: KeyboardEvent) => {
    if (event.key !== 'ArrowUp' && event.key !== 'ArrowDown') return
    event.preventDefault()
    event.stopPropagation()
    const step = (event.shiftKey ? 1 : 10) * (event.key === 'ArrowUp' ? 1 : -1)
    move(which, (which === 'from' ? latest.current.fromMPa : latest.current.toMPa) + step)
    clearTimeout(timer.current)
    timer.current = setTimeout(rest, pauseMs)
  }
  const pull = (event: PointerEvent<SVGGElement>) => {
    if (!dragged.current) return
    const svg = event.currentTarget.ownerSVGElement
    const box = svg?.getBoundingClientRect()
    if (box && box.width > 0) move(dragged.current, y.invert((event.clientY - box.top) * (width / box.width)))
  }
  const right = width - margins.right
  const middle = (y(ends.fromMPa) + y(ends.toMPa)) / 2
  return (
    <g>
      {Math.abs(y(ends.fromMPa) - y(ends.toMPa)) > 24 && <text x={right - 104} y={middle + 4} textAnchor="end" className="ax">elastic window, {points} points</text>}
      {(['from', 'to'] as const).map((which) => {
        const value = which === 'from' ? ends.fromMPa : ends.toMPa
        const at = y(value)
        return (
          <g
            key={which} role="slider" aria-orientation="vertical" tabIndex={locked ? -1 : 0} aria-label={`Elastic window ${which}`} aria-valuenow={value} aria-valuemin={0} aria-valuemax={most} aria-valuetext={`${value} MPa`} aria-readonly={locked ? true : undefined}
            className="touch-none outline-none [&:focus-visible>rect]:[stroke-width:3px]" onKeyDown={locked ? undefined : keys(which)}
            onPointerDown={locked ? undefined : (event) => { dragged.current = which; event.currentTarget.setPointerCapture(event.pointerId) }}
            onPointerMove={pull} onPointerUp={() => { if (dragged.current) { dragged.current = null; rest() } }}
          >
            <path d={`M${x.range()[0] ?? 0} ${at}H${right}`} className="hair" />
            <rect x={right - 92} y={at - 22} width={92} height={44} fill="transparent" style={{ stroke: 'none' }} />
            <rect x={right - 92} y={at - 15} width={92} height={30} className="grip" />
            <path d={`M${right - 82} ${at - 5}v10M${right - 78} ${at - 5}v10M${right - 74} ${at - 5}v10`} className="con" />
            <text x={right - 10} y={at + 5} textAnchor="end" className="lab">{value} MPa</text>
          </g>
        )
      })}
    </g>
  )
}
