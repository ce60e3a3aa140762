import type { Picture } from '../method/picture.ts'
import { tensilePicture, type TensilePicture } from './curve.ts'
import type { TensileParameters } from './tensile-parameters.ts'
import type { TensileReadings } from './tensile-readings.ts'
import { thinned } from './thinned.ts'

/** Columns for which a curve is thinned: more than any screen or page shows. */
const columns = 900

/** The elastic end with its construction, and the whole curve: proof strength is decided in the first percent. */
export function tensilePictures({ parameters, readings }: { parameters: TensileParameters; readings: TensileReadings }): Picture[] {
  const picture = tensilePicture(parameters, readings)
  return picture ? [elasticEnd(picture), wholeCurve(picture)] : []
}

const axes = { x: { label: 'Extension e, % of Le', unit: '%' }, y: { label: 'Stress R', unit: 'MPa' } }

function elasticEnd(picture: TensilePicture): Picture {
  const { strainPercent, stressMPa, lastPoint, points, elastic, line, offsetLine } = picture
  const proof = points.find(({ name }) => name === 'Rp')
  const yielding = points.find(({ name }) => name === 'ReH')
  const from = Math.min(0, strainPercent[0] ?? 0)
  const to = Math.max(from + 0.2, 1.55 * Math.max(proof?.strainPercent ?? 0, yielding?.strainPercent ?? 0, (offsetLine?.zeroPercent ?? 0) + 0.2))
  const top = Math.max(proof?.stressMPa ?? 0, yielding?.stressMPa ?? 0, elastic?.toMPa ?? 0)
  const straight = (slope: number, zero: number, upTo: number): [number, number][] => [[zero, 0], [zero + upTo / slope, upTo]]
  return {
    ...axes, title: 'Elastic end',
    lines: [
      { kind: 'curve', points: thinned(strainPercent, stressMPa, columns, { from, to, lastPoint }) },
      ...(line ? [{ kind: 'dashed' as const, points: straight(line.slopeMPaPerPercent, line.zeroPercent, top * 1.12) }] : []),
      ...(offsetLine && line ? [{ kind: 'construction' as const, points: straight(line.slopeMPaPerPercent, offsetLine.zeroPercent, top * 1.12) }] : []),
      ...(proof ? [{ kind: 'dashed' as const, points: [[from, proof.stressMPa], [proof.strainPercent, proof.stressMPa]] as [number, number][] }] : []),
    ],
    marks: points.filter(({ name }) => name === 'Rp' || name === 'ReH' || name === 'ReL').map(({ symbol, strainPercent: x, stressMPa: y }) => ({ x, y, label: `${symbol} ${Math.round(y)} MPa` })),
    ...(elastic && { window: { from: elastic.fromMPa, to: elastic.toMPa } }),
  }
}

function wholeCurve({ strainPercent, stressMPa, lastPoint, points }: TensilePicture): Picture {
  return {
    ...axes, title: 'Whole curve',
    lines: [{ kind: 'curve', points: thinned(strainPercent, stressMPa, columns, { from: Math.min(0, strainPercent[0] ?? 0), to: strainPercent[lastPoint] ?? 1, lastPoint }) }],
    marks: points.filter(({ name }) => name === 'Rm' || name === 'ReH' || name === 'Rp').map(({ symbol, strainPercent: x, stressMPa: y }) => ({ x, y, label: `${symbol} ${Math.round(y)} MPa` })),
  }
}
