/** The curve as stress in MPa and strain as a fraction of the extensometer's gauge length, point by point in the order of the record. */
export type StressStrain = { strain: Float64Array; stress: Float64Array }

/** A record as it comes from the frame. */
export type Curve = { extensionMm: readonly number[]; forceN: readonly number[]; timeS?: readonly number[] }

/** R = F / S0 (MPa = N/mm²) and e = ΔL / Le for every point (ISO 6892-1, 3.3.7 and 3.10; no correction of any kind). */
export function stressStrain(curve: Curve, areaMm2: number, gaugeLengthMm: number): StressStrain {
  const { extensionMm, forceN } = curve
  const count = forceN.length
  const strain = new Float64Array(count)
  const stress = new Float64Array(count)
  const perArea = 1 / areaMm2
  const perLength = 1 / gaugeLengthMm
  for (let i = 0; i < count; i++) {
    strain[i] = extensionMm[i]! * perLength
    stress[i] = forceN[i]! * perArea
  }
  return { strain, stress }
}
