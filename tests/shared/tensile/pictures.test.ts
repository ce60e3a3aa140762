import { describe, expect, it } from 'vitest'
import { methodOf } from '../../../shared/methods.ts'

/** A bar that yields nowhere: straight to 300 MPa, then on at a hundredth of the slope. E = 200 GPa, S0 = 100 mm2, Le = 50 mm. */
const strains = Array.from({ length: 400 }, (_, at) => at * 2e-5)
const stress = (strain: number) => (strain <= 0.0015 ? 200_000 * strain : 300 + 2000 * (strain - 0.0015))
const input = {
  parameters: { standard: 'ISO 6892-1', section: { shape: 'area', areaMm2: 100 }, originalGaugeLengthMm: 50, extensometerGaugeLengthMm: 50, offsetPercent: 0.2 },
  readings: { curve: { extensionMm: strains.map((strain) => strain * 50), forceN: strains.map((strain) => stress(strain) * 100) } },
}
const tensile = methodOf('tensile')!

describe('the pictures of a pull', () => {
  it('marks the proof strength where the offset line meets the curve', () => {
    const [elastic] = tensile.pictures!(input)
    // closed form: Rp = (sy + Eh (p - sy/E)) / (1 - Eh/E) = (300 + 2000 (0.002 - 0.0015)) / 0.99
    const [mark] = elastic!.marks
    expect(mark!.y).toBeCloseTo(304.04, 1)
    const offset = elastic!.lines.find(({ kind }) => kind === 'construction')!.points
    expect(offset[0]![0]).toBeCloseTo(0.2, 3)
    expect(elastic!.window!.to).toBeLessThanOrEqual(300.5)
  })
  it('has no picture without a record', () => expect(tensile.pictures!({ ...input, readings: { maximumForceN: 50_000 } })).toEqual([]))
})
