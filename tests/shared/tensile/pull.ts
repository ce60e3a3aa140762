import { tensile } from '../../../shared/tensile/tensile.ts'

/** Points of a curve: strain as a fraction, stress in MPa. */
export type Points = (readonly [strain: number, stress: number])[]
export const area = 50
export const gauge = 50

/** Ramberg-Osgood: e = R/E + 0.002 (R/R02)^n, up to `top` times R02, at even steps of stress. Closed form: Rp0.2 = R02. */
export function rambergOsgood({ modulus = 205_000, proof = 400, n = 12, count = 600, top = 1.2 } = {}): Points {
  return Array.from({ length: count }, (_, i) => {
    const stress = (top * proof * i) / (count - 1)
    return [stress / modulus + 0.002 * (stress / proof) ** n, stress] as const
  })
}

/** Elastic to 300 MPa, hardening by a parabola to 450 MPa at 16 %, then down to 0.7 of it at 28 %. */
export function ductile(): Points {
  const points: [number, number][] = []
  for (let i = 0; i <= 150; i++) points.push([(2 * i) / 200_000, 2 * i])
  for (let i = 1; i <= 200; i++) points.push([0.0015 + (0.1585 * i) / 200, 300 + 150 * (1 - (1 - i / 200) ** 2)])
  for (let i = 1; i <= 100; i++) points.push([0.16 + (0.12 * i) / 100, 450 - 135 * (i / 100) ** 2])
  return points
}

export function pull(points: Points, { parameters = {}, readings = {} }: { parameters?: object; readings?: object } = {}) {
  const curve = { extensionMm: points.map(([strain]) => strain * gauge), forceN: points.map(([, stress]) => stress * area) }
  return found({ section: { shape: 'area', areaMm2: area }, extensometerGaugeLengthMm: gauge, ...parameters }, { curve, ...readings })
}

export function found(parameters: object, readings: object) {
  const { results, checks } = tensile.evaluate({ parameters: { standard: 'ISO 6892-1', ...parameters }, readings })
  const of = (key: string) => results.find((one) => one.key === key)
  return { results, checks, of, value: (key: string) => of(key)?.value ?? NaN, reported: (key: string) => of(key)?.reported, keys: results.map((one) => one.key), codes: checks.map((one) => one.code) }
}
