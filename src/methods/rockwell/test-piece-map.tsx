import type { Check } from '../../../shared/method/method.ts'
import { indentationDiameter, rockwellDepth } from '../../../shared/hardness/rockwell/rockwell-depth.ts'
import type { RockwellReading } from '../../../shared/hardness/rockwell/rockwell-input.ts'
import { rockwellSpacing } from '../../../shared/hardness/rockwell/rockwell-rules.ts'
import type { RockwellScale } from '../../../shared/hardness/rockwell/rockwell-scale.ts'
import { PictureFrame } from '../../components/ui/pictures/picture-frame.tsx'
import { PlainTable } from '../../components/ui/table/plain-table.tsx'
import { formatNumber } from '../../lib/format.ts'

const width = 384
const height = 262

/** Where the readings sit. Rings of half the least spacing: where two of them overlap, the readings are too near each other. */
export function TestPieceMap({ scale, readings, checks }: { scale: RockwellScale; readings: readonly RockwellReading[]; checks: readonly Check[] }) {
  const points = readings.flatMap(({ xMm, yMm, edgeMm, value }, place) => (xMm === undefined && yMm === undefined ? [] : [{ place, xMm: xMm ?? 0, yMm: yMm ?? 0, edgeMm, d: indentationDiameter(scale, rockwellDepth(scale, value)) }]))
  const d = Math.max(...points.map((point) => point.d))
  const room = Math.max(rockwellSpacing.edge * d, ...points.map(({ edgeMm }) => edgeMm ?? 0))
  const from = { x: Math.min(...points.map(({ xMm }) => xMm)) - room, y: Math.min(...points.map(({ yMm }) => yMm)) - room }
  const to = { x: Math.max(...points.map(({ xMm }) => xMm)) + room, y: Math.max(...points.map(({ yMm }) => yMm)) + room }
  const perMm = Math.min((width - 4) / (to.x - from.x), (height - 36) / (to.y - from.y))
  const left = (width - (to.x - from.x) * perMm) / 2
  const top = (height - 34 - (to.y - from.y) * perMm) / 2
  const x = (mm: number) => left + (mm - from.x) * perMm
  const y = (mm: number) => top + (to.y - mm) * perMm
  const bad = new Set(checks.filter(({ severity }) => severity === 'error').map(({ reading }) => reading))
  const half = rockwellSpacing.centres / 2
  return (
    <PictureFrame
      title="On the test piece" width={width} height={height} description={`Places of ${points.length} readings, ${bad.size === 0 ? 'none too near another or the edge' : `${[...bad].map((place) => (place ?? 0) + 1).join(', ')} breaking a rule`}.`}
      table={<PlainTable caption="Places of the readings" rows={points} rowId={({ place }) => String(place)} columns={[
        { id: 'n', head: 'Reading', cell: ({ place }) => place + 1 }, { id: 'x', head: 'x', unit: 'mm', numeric: true, cell: ({ xMm }) => formatNumber(xMm, 2) },
        { id: 'y', head: 'y', unit: 'mm', numeric: true, cell: ({ yMm }) => formatNumber(yMm, 2) }, { id: 'd', head: 'Diameter of the print', unit: 'mm', numeric: true, cell: (point) => formatNumber(point.d, 2) },
      ]} />}
    >
      {points.map(({ place, xMm, yMm, d: diameter }) => {
        const isBad = bad.has(place)
        const ring = half * diameter * perMm
        return (
          <g key={place}>
            <circle cx={x(xMm)} cy={y(yMm)} r={ring} className={isBad ? 'redline' : 'hair dash2'} />
            <circle cx={x(xMm)} cy={y(yMm)} r={Math.max(3.5, (diameter * perMm) / 2)} className={isBad ? 'flagged' : 'point'} />
            <text x={x(xMm)} y={y(yMm) - ring - 7} textAnchor="middle" className={isBad ? 'lab redtext' : 'lab'}>{place + 1}</text>
          </g>
        )
      })}
      <text x={2} y={height - 6} className="ax">{formatNumber(Math.max(...points.map(({ xMm }) => xMm)) - Math.min(...points.map(({ xMm }) => xMm)), 1)} mm from first to last</text>
      <text x={width - 2} y={height - 6} textAnchor="end" className="ax">rings of {formatNumber(half, 1)} d</text>
    </PictureFrame>
  )
}
