import type { Misfit } from '../../method/method.ts'
import type { Piece } from '../../method/piece.ts'
import { round } from '../../units/round.ts'
import { correctableDiameters } from './cylinder-correction.ts'
import { indentationDiameter, rockwellDepth } from './rockwell-depth.ts'
import type { RockwellParameters } from './rockwell-input.ts'
import { depthsOfThickness, rockwellSpacing } from './rockwell-rules.ts'
import { rockwellScale, rockwellScales, type RockwellScale } from './rockwell-scale.ts'

/** What Rockwell on this scale cannot take of a piece: too thin, no surface large enough, a curve that no table corrects. */
export function rockwellMisfits(parameters: RockwellParameters, piece: Piece): Misfit[] {
  return [...tooThin(parameters, piece), ...tooSmall(parameters, piece), ...tooCurved(parameters)]
}

/**
 * Softest hardness that a thickness allows: N − t/(f S). A third of the scale at the hard end must be left, else the piece
 * counts as too thin: what it will read is not known at order.
 */
function tooThin(parameters: RockwellParameters, piece: Piece): Misfit[] {
  const { standard, scale } = parameters
  const thickness = parameters.thicknessMm ?? piece.thicknessMm
  if (thickness === undefined) return []
  const softest = softestFor(parameters, scale, thickness)
  const { from, to } = rockwellScale[scale]
  if (softest <= hardThird(scale)) return []
  const lighter = lighterScales(scale).filter((one) => softestFor(parameters, one, thickness) <= hardThird(one))
  const rule = `${depthsOfThickness(standard, scale)} times the depth of the print`
  const limit = softest > to ? `for ${scale} at any hardness from ${from} to ${to}` : `for ${scale} below ${round(softest, '1')} ${scale}`
  return [{ message: `${thickness} mm is too thin ${limit}: ${rule} must fit in`, cures: lighter.map((one) => ({ label: `Test ${one} instead`, parameters: { scale: one } })) }]
}

/** The print and its distance to both edges must fit across a flat end face or a strip. */
function tooSmall({ scale, surface }: RockwellParameters, piece: Piece): Misfit[] {
  if (surface.shape !== 'flat') return []
  const isRound = piece.diameterMm !== undefined && (piece.form === 'bar' || piece.form === 'wire')
  const across = isRound ? piece.diameterMm : piece.widthMm
  if (across === undefined) return []
  const needed = (one: RockwellScale) => 2 * rockwellSpacing.edge * indentationDiameter(one, rockwellDepth(one, hardThird(one)))
  if (across >= needed(scale)) return []
  const lighter = lighterScales(scale).filter((one) => across >= needed(one))
  return [{
    message: `${across} mm across leaves no room for a ${scale} print ${rockwellSpacing.edge} diameters from every edge: about ${round(needed(scale), '0.1')} mm are needed`,
    cures: lighter.map((one) => ({ label: `Test ${one} instead`, parameters: { scale: one } })),
  }]
}

function tooCurved({ scale, surface }: RockwellParameters): Misfit[] {
  if (surface.shape !== 'cylinder') return []
  const range = correctableDiameters(scale)
  if (range && surface.diameterMm >= range.from && surface.diameterMm <= range.to) return []
  return [{
    message: range ? `a cylinder of ${surface.diameterMm} mm lies outside the table of corrections for ${scale}, ${range.from} to ${range.to} mm`
      : `there is no table of corrections for ${scale} on a cylinder`,
    cures: [{ label: 'Test on a flat', parameters: { surface: { shape: 'flat' } } }],
  }]
}

function softestFor({ standard }: RockwellParameters, scale: RockwellScale, thicknessMm: number): number {
  const { zeroDepth, unitMm } = rockwellScale[scale]
  return zeroDepth - thicknessMm / (depthsOfThickness(standard, scale) * unitMm)
}

/** Where the hard third of a scale begins. */
function hardThird(scale: RockwellScale): number {
  const { from, to } = rockwellScale[scale]
  return to - (to - from) / 3
}

/** Scales of the same indenter at less force, heaviest first. */
function lighterScales(scale: RockwellScale): RockwellScale[] {
  const { indenter, totalForceKgf, ballDiameterMm } = rockwellScale[scale]
  const force = (one: RockwellScale) => rockwellScale[one].totalForceKgf
  return rockwellScales.filter((one) => rockwellScale[one].indenter === indenter && force(one) < totalForceKgf && (rockwellScale[one].ballDiameterMm ?? 0) <= (ballDiameterMm ?? 0))
    .sort((a, b) => force(b) - force(a))
}
