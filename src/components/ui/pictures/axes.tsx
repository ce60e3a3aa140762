import { formatNumber } from '../../../lib/format.ts'
import type { Plane } from './plane.ts'
import { stepDecimals } from '../fields/read-number.ts'

export type Axis = { label: string; unit?: string; ticks?: number; /** Multiplies what is shown: 100 for a strain in percent. */ times?: number }

/** Hairline grid, ink axis and figures of a picture. */
export function Axes({ plane: { x, y, width, height, margins }, xAxis, yAxis }: { plane: Plane; xAxis: Axis; yAxis: Axis }) {
  const bottom = height - margins.bottom
  const right = width - margins.right
  const xTicks = x.ticks(xAxis.ticks ?? Math.max(2, Math.round(width / 110)))
  const yTicks = y.ticks(yAxis.ticks ?? Math.max(2, Math.round(height / 70)))
  return (
    <g aria-hidden>
      {yTicks.map((tick) => (
        <g key={tick}>
          <path d={`M${margins.left} ${y(tick)}H${right}`} className="grid" />
          <text x={margins.left - 10} y={y(tick) + 4} textAnchor="end" className="ax">{figure(tick, yTicks, yAxis.times)}</text>
        </g>
      ))}
      <path d={`M${margins.left} ${bottom}H${right}`} className="axis" />
      {xTicks.map((tick) => (
        <g key={tick}>
          <path d={`M${x(tick)} ${bottom}v5`} className="axis" />
          <text x={x(tick)} y={bottom + 20} textAnchor="middle" className="ax">{figure(tick, xTicks, xAxis.times)}</text>
        </g>
      ))}
      <text x={margins.left - 54} y={12} className="ax">{title(yAxis)}</text>
      <text x={right} y={bottom + 38} textAnchor="end" className="ax">{title(xAxis)}</text>
    </g>
  )
}

function title({ label, unit }: Axis): string {
  return unit ? `${label}, ${unit}` : label
}

/** All figures of an axis have the decimals that its step needs. */
function figure(tick: number, ticks: readonly number[], times = 1): string {
  const step = Number((((ticks[1] ?? 1) - (ticks[0] ?? 0)) * times).toPrecision(6))
  return formatNumber(tick * times, Math.min(6, stepDecimals(step)))
}
