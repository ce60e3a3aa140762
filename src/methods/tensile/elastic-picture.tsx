import { thinned } from '../../../shared/tensile/thinned.ts'
import type { TensilePicture } from '../../../shared/tensile/curve.ts'
import { Kbd } from '../../components/ui/kbd.tsx'
import { Axes } from '../../components/ui/pictures/axes.tsx'
import { MaskedLabel } from '../../components/ui/pictures/masked-label.tsx'
import { PictureFrame } from '../../components/ui/pictures/picture-frame.tsx'
import { linePath, plane } from '../../components/ui/pictures/plane.ts'
import { useWidth } from '../../components/ui/pictures/use-width.ts'
import { PlainTable } from '../../components/ui/table/plain-table.tsx'
import { formatNumber } from '../../lib/format.ts'
import type { SheetViewProps } from '../sheet-view.ts'
import { ElasticGrips } from './elastic-grips.tsx'

const height = 330

/** The elastic end, large, where the proof strength is decided: the fit, its window held by two grips, the offset line. */
export function ElasticPicture({ picture, sheet }: { picture: TensilePicture; sheet: SheetViewProps }) {
  const [ref, width] = useWidth(690)
  const { elastic, line, offsetLine, points, strainPercent, stressMPa, lastPoint } = picture
  const to = rightEnd(picture)
  const curve = thinned(strainPercent, stressMPa, width, { from: 0, to, lastPoint })
  const inSight = curve.filter(([strain]) => strain <= to)
  const top = 1.12 * Math.max(1, ...inSight.map(([, stress]) => stress))
  const drawn = plane({ width, height, margins: { top: 20, right: 18, bottom: 46, left: 64 }, x: [0, to], y: [0, top] })
  const { x, y, margins } = drawn
  const right = width - margins.right
  const clip = `clip-${sheet.run.id}`
  const lineTo = (zero: number, slope: number) => `M${x(zero)} ${y(0)}L${x(zero + top / slope)} ${y(top)}`
  const proof = points.find(({ name }) => name === 'Rp')
  const yields = points.filter(({ name, strainPercent: at }) => (name === 'ReH' || name === 'ReL') && at <= to)
  return (
    <PictureFrame
      ref={ref} title="Elastic end" isMoved width={width} height={height} className="mb-2"
      description={`Stress against extension up to ${formatNumber(to)} %${elastic ? `, elastic window ${Math.round(elastic.fromMPa)} to ${Math.round(elastic.toMPa)} MPa` : ''}${proof ? `, ${proof.symbol} ${Math.round(proof.stressMPa)} MPa` : ''}.`}
      aside={<>{elastic && line && <span>slope {formatNumber(line.slopeMPa / 1000, 1)} GPa, r² {elastic.rSquared.toFixed(5)}, {elastic.chosen}</span>}{!sheet.locked && elastic && <span className="max-tablet:hidden">drag a grip, or <Kbd>↑</Kbd> <Kbd>↓</Kbd> by 10 MPa</span>}</>}
      table={<CurveTable rows={curve.filter((_, place) => place % Math.ceil(curve.length / 150) === 0)} points={points} />}
    >
      <clipPath id={clip}><rect x={margins.left} y={margins.top - 12} width={right - margins.left} height={height - margins.top - margins.bottom + 12} /></clipPath>
      {elastic && <rect x={margins.left} y={y(elastic.toMPa)} width={right - margins.left} height={Math.max(0, y(elastic.fromMPa) - y(elastic.toMPa))} className="window" />}
      <Axes plane={drawn} xAxis={{ label: 'extension e', unit: '% of Le' }} yAxis={{ label: 'R', unit: 'MPa' }} />
      <g clipPath={`url(#${clip})`}>
        <path d={linePath(curve, drawn)} className="curve" />
        {elastic && <path d={`M${x(elastic.from.strainPercent)} ${y(elastic.from.stressMPa)}L${x(elastic.to.strainPercent)} ${y(elastic.to.stressMPa)}`} className="fitted" />}
        {line && line.slopeMPaPerPercent > 0 && <path d={lineTo(line.zeroPercent, line.slopeMPaPerPercent)} className="con dash" />}
        {offsetLine && offsetLine.slopeMPaPerPercent > 0 && <path d={lineTo(offsetLine.zeroPercent, offsetLine.slopeMPaPerPercent)} className="con" />}
      </g>
      {line && offsetLine && <Offset from={x(line.zeroPercent)} to={x(offsetLine.zeroPercent)} at={y(0) - 22} text={`${formatNumber(offsetLine.offsetPercent)} %`} />}
      {proof && (
        <g>
          <path d={`M${margins.left} ${y(proof.stressMPa)}H${x(proof.strainPercent)}`} className="con dash" />
          <MaskedLabel x={x(proof.strainPercent) + 18} y={y(proof.stressMPa) + 34} text={`${indexed(proof.symbol)} ${Math.round(proof.stressMPa)} MPa`} look="big" />
          <circle cx={x(proof.strainPercent)} cy={y(proof.stressMPa)} r={6} className="node" />
          <path d={`M${x(proof.strainPercent) - 11} ${y(proof.stressMPa)}h22M${x(proof.strainPercent)} ${y(proof.stressMPa) - 11}v22`} className="con" />
        </g>
      )}
      {yields.map(({ name, symbol, strainPercent: at, stressMPa: stress }) => (
        <g key={name}>
          <MaskedLabel x={x(at) + 12} y={y(stress) + (name === 'ReH' ? -10 : 22)} text={`${indexed(symbol)} ${Math.round(stress)} MPa`} />
          <circle cx={x(at)} cy={y(stress)} r={5} className="node" />
        </g>
      ))}
      {elastic && <ElasticGrips sheet={sheet} fromMPa={elastic.fromMPa} toMPa={elastic.toMPa} points={elastic.points} drawn={drawn} most={Math.floor(top)} />}
    </PictureFrame>
  )
}

function Offset({ from, to, at, text }: { from: number; to: number; at: number; text: string }) {
  return (
    <g>
      <path d={`M${from} ${at - 6}v12M${to} ${at - 6}v12M${from} ${at}H${to}`} className="con" />
      <MaskedLabel x={(from + to) / 2} y={at + 4.5} anchor="middle" text={text} />
    </g>
  )
}

/** The same numbers: the named points first, then the curve as drawn. */
export function CurveTable({ rows, points }: { rows: readonly (readonly [number, number])[]; points: TensilePicture['points'] }) {
  const all = [...points.map(({ symbol, strainPercent, stressMPa }) => ({ what: symbol, strain: strainPercent, stress: stressMPa })), ...rows.map(([strain, stress], place) => ({ what: `point ${place + 1}`, strain, stress }))]
  return (
    <PlainTable caption="Points of the curve" rows={all} rowId={({ what }) => what} columns={[
      { id: 'what', head: 'Point', cell: ({ what }) => what }, { id: 'strain', head: 'Extension', unit: '% of Le', numeric: true, cell: ({ strain }) => formatNumber(strain, 4) },
      { id: 'stress', head: 'Stress', unit: 'MPa', numeric: true, cell: ({ stress }) => formatNumber(stress, 1) },
    ]} />
  )
}

/** "Rp0.2" with its index marked for a picture: "R|p0.2|". */
export function indexed(symbol: string): string {
  return symbol.replace(/^([RALS])(.+)$/, '$1|$2|')
}

/** As far to the right as the offset line and the yield points need, in steps that are read easily. */
function rightEnd({ points, offsetLine, strainPercent, lastPoint }: TensilePicture): number {
  const wanted = Math.max(...points.filter(({ name }) => name === 'Rp' || name === 'ReH' || name === 'ReL').map((point) => point.strainPercent * 1.5), (offsetLine?.zeroPercent ?? 0.2) * 3, 0.2)
  const end = Math.min(wanted, Math.max(0.05, strainPercent[lastPoint] ?? wanted))
  const step = 10 ** Math.floor(Math.log10(end)) / 2
  return Math.ceil(end / step) * step
}
