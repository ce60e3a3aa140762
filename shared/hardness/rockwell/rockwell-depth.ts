import { rockwellScale, type RockwellScale } from './rockwell-scale.ts'

/**
 * Permanent depth of a Rockwell indentation in mm, h = (N − HR) · S (ISO 6508-1:2016, definition of HR), never below zero; the reading as
 * the machine showed it, before any correction for a curved surface.
 * @example rockwellDepth('HRC', 60) // 0.08
 */
export function rockwellDepth(scale: RockwellScale, reading: number): number {
  const { zeroDepth, unitMm } = rockwellScale[scale]
  return Math.max(0, (zeroDepth - reading) * unitMm)
}

const TIP_RADIUS = 0.2
/** Where the tip's sphere of 0.2 mm goes over into the cone of 120°: depth R (1 − sin 60°), radius R cos 60°. */
const TIP_DEPTH = TIP_RADIUS * (1 - Math.sin(Math.PI / 3))
const TIP_EDGE = TIP_RADIUS / 2

/**
 * Diameter in mm of the print that an indenter leaves at `depthMm`: of a ball d = 2 √(h (D − h)); of the 120° cone with its 0.2 mm tip
 * d = 2 (0.1 + (h − 0.0268) tan 60°), and 2 √(h (0.4 − h)) where only the tip went in. The depth under preliminary force
 * comes on top and is not known, so the true print is somewhat larger: what breaks a spacing rule by this diameter breaks it surely.
 * @example indentationDiameter('HRC', 0.08) // 0.3843
 */
export function indentationDiameter(scale: RockwellScale, depthMm: number): number {
  const { ballDiameterMm } = rockwellScale[scale]
  if (ballDiameterMm !== undefined) return sphere(depthMm, ballDiameterMm)
  return depthMm <= TIP_DEPTH ? sphere(depthMm, 2 * TIP_RADIUS) : 2 * (TIP_EDGE + (depthMm - TIP_DEPTH) * Math.sqrt(3))
}

/** What the diameter is taken from, for people. */
export function diameterFormula(scale: RockwellScale): string {
  const { ballDiameterMm } = rockwellScale[scale]
  return ballDiameterMm === undefined ? 'd of a 120° cone with 0.2 mm tip at depth h = (N − HR) S' : `d = 2 √(h (${ballDiameterMm} − h)) at depth h = (N − HR) S`
}

function sphere(depthMm: number, diameterMm: number): number {
  const depth = Math.min(depthMm, diameterMm / 2)
  return 2 * Math.sqrt(depth * (diameterMm - depth))
}
