import { thinned } from '../../../shared/tensile/thinned.ts'
import type { TensilePicture } from '../../../shared/tensile/curve.ts'
import { Axes } from '../../components/ui/pictures/axes.tsx'
import { MaskedLabel } from '../../components/ui/pictures/masked-label.tsx'
import { PictureFrame } from '../../components/ui/pictures/picture-frame.tsx'
import { extent, linePath, plane } from '../../components/ui/pictures/plane.ts'
import { useWidth } from '../../components/ui/pictures/use-width.ts'
import { CurveTable, indexed } from './elastic-picture.tsx'

const height = 170

/** The whole curve, small: strength, the extension at it, and the fracture are not in doubt. */
export function WholePicture({ picture: { strainPercent, stressMPa, lastPoint, points } }: { picture: TensilePicture }) {
  const [ref, width] = useWidth(690)
  const curve = thinned(strainPercent, stressMPa, width, { from: 0, to: extent(strainPercent)[1], lastPoint })
  const drawn = plane({ width, height, margins: { top: 26, right: 18, bottom: 44, left: 64 }, x: [0, extent(curve.map(([strain]) => strain))[1] * 1.05], y: [0, extent(curve.map(([, stress]) => stress))[1] * 1.08] })
  const { x, y } = drawn
  const strength = points.find(({ name }) => name === 'Rm')
  const uniform = points.find(({ name }) => name === 'Agt')
  const fracture = points.find(({ name }) => name === 'fracture')
  return (
    <PictureFrame
      ref={ref} title="Whole curve" width={width} height={height} className="mb-5" table={<CurveTable rows={curve.filter((_, place) => place % Math.ceil(curve.length / 150) === 0)} points={points} />}
      description={`The whole curve${strength ? `, tensile strength ${Math.round(strength.stressMPa)} MPa at ${strength.strainPercent.toFixed(1)} %` : ''}.`}
    >
      <Axes plane={drawn} xAxis={{ label: 'extension e', unit: '% of Le' }} yAxis={{ label: 'R', unit: 'MPa', ticks: 3 }} />
      <path d={linePath(curve, drawn)} className="curve" />
      {uniform && <path d={`M${x(uniform.strainPercent)} ${y(uniform.stressMPa)}V${y(0)}`} className="con dash" />}
      {uniform && <MaskedLabel x={x(uniform.strainPercent) + 8} y={y(0) - 14} text={`A|gt| ${uniform.strainPercent.toFixed(1)} %`} look="ax" />}
      {strength && <MaskedLabel x={x(strength.strainPercent)} y={y(strength.stressMPa) - 11} anchor="middle" text={`${indexed(strength.symbol)} ${Math.round(strength.stressMPa)} MPa`} />}
      {strength && <circle cx={x(strength.strainPercent)} cy={y(strength.stressMPa)} r={5} className="node" />}
      {fracture && <path d={`M${x(fracture.strainPercent) - 5} ${y(fracture.stressMPa) - 5}l10 10m0 -10l-10 10`} className="con" />}
    </PictureFrame>
  )
}
