import { analysisOf } from './evaluate-tensile.ts'
import { proofSymbol } from './results/strengths.ts'
import type { TensileParameters } from './tensile-parameters.ts'
import type { TensileReadings } from './tensile-readings.ts'

/** A point of the picture: strain in % of Le, stress in MPa. */
export type PicturePoint = { strainPercent: number; stressMPa: number }
export type PicturePointName = 'Rp' | 'ReH' | 'ReL' | 'Rm' | 'Agt' | 'fracture'

/** What the picture of a pull shows, on the bench and on paper. Strains in % as recorded, not shifted; stresses in MPa. */
export type TensilePicture = {
  strainPercent: Float64Array
  stressMPa: Float64Array
  /** Last point before the force collapses or the extensometer comes off; what follows is no property of the test piece. */
  lastPoint: number
  /** The stretch the elastic line was fitted over; missing when there was none. */
  elastic?: { fromMPa: number; toMPa: number; points: number; rSquared: number; chosen: 'by rule' | 'by hand'; from: PicturePoint; to: PicturePoint }
  /** stress = slopeMPaPerPercent · (strain in % - zeroPercent) */
  line?: { slopeMPa: number; slopeMPaPerPercent: number; interceptMPa: number; zeroPercent: number }
  /** The elastic line shifted by the offset. */
  offsetLine?: { slopeMPaPerPercent: number; zeroPercent: number; offsetPercent: number }
  points: ({ name: PicturePointName; symbol: string } & PicturePoint)[]
}

/** The picture of a run's curve, from what the engine found in it. Null without a record or without a gauge length. */
export function tensilePicture(parameters: TensileParameters, readings: TensileReadings): TensilePicture | null {
  const analysis = analysisOf(parameters, readings)
  if (!analysis) return null
  const { curve, end, line, proof, yielding, maximum, highest, fracture } = analysis
  const { offsetPercent } = parameters
  const strainPercent = Float64Array.from(curve.strain, (strain) => 100 * strain)
  const points: TensilePicture['points'] = []
  const add = (name: PicturePointName, symbol: string, at: { strain: number; stress: number } | null | undefined) => {
    if (at) points.push({ name, symbol, strainPercent: 100 * at.strain, stressMPa: at.stress })
  }
  add('Rp', proofSymbol(offsetPercent), proof)
  add('ReH', 'ReH', yielding?.upper)
  add('ReL', 'ReL', yielding?.lower)
  const top = parameters.standard === 'ASTM E8/E8M' ? highest : maximum
  add('Rm', 'Rm', top && top.index <= end.lastExtension ? { strain: top.strain, stress: top.stress } : null)
  if (maximum?.isReached && maximum.index <= end.lastExtension) add('Agt', 'Agt', maximum)
  add('fracture', 'A', fracture)
  const picture: TensilePicture = { strainPercent, stressMPa: curve.stress, lastPoint: Math.min(end.last, end.lastExtension), points }
  if (!line) return picture
  const at = (i: number): PicturePoint => ({ strainPercent: strainPercent[i] ?? 0, stressMPa: curve.stress[i] ?? 0 })
  const slopeMPaPerPercent = line.slope / 100
  const zeroPercent = 100 * line.zeroStrain
  return {
    ...picture,
    elastic: { fromMPa: line.fromMPa, toMPa: line.toMPa, points: line.points, rSquared: line.rSquared, chosen: line.chosen, from: at(line.from), to: at(line.to) },
    line: { slopeMPa: line.slope, slopeMPaPerPercent, interceptMPa: line.intercept, zeroPercent },
    offsetLine: { slopeMPaPerPercent, zeroPercent: zeroPercent + offsetPercent, offsetPercent },
  }
}
