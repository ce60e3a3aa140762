import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { ZodError } from 'zod'
import { tensile } from '../../../shared/tensile/tensile.ts'
import { area, ductile, found, gauge, pull, rambergOsgood } from './pull.ts'

describe('the elastic line and the proof strength', () => {
  it('do not depend on how densely the curve was sampled', () => {
    fc.assert(fc.property(fc.integer({ min: 150, max: 4000 }), fc.integer({ min: 8, max: 30 }), fc.constantFrom(70_000, 110_000, 205_000), (count, n, modulus) => {
      const { value } = pull(rambergOsgood({ modulus, n, count, proof: modulus / 500 }))
      expect(Math.abs(value('proofStrength') / (modulus / 500) - 1)).toBeLessThan(0.003)
      expect(Math.abs(value('slope') / modulus - 1)).toBeLessThan(0.015)
    }), { numRuns: 40 })
  })

  it('do not change when force and area grow together', () => {
    const base = pull(ductile())
    fc.assert(fc.property(fc.double({ min: 0.01, max: 500, noNaN: true }), (factor) => {
      const points = ductile()
      const curve = { extensionMm: points.map(([strain]) => strain * gauge), forceN: points.map(([, stress]) => stress * area * factor) }
      const scaled = found({ section: { shape: 'area', areaMm2: area * factor }, extensometerGaugeLengthMm: gauge }, { curve })
      for (const { key, value } of base.results) if (key !== 'area') expect(scaled.value(key) / value).toBeCloseTo(1, 6)
    }), { numRuns: 30 })
  })

  it('do not change when the extensometer starts elsewhere', () => {
    fc.assert(fc.property(fc.double({ min: -0.02, max: 0.02, noNaN: true }), (shift) => {
      const moved = pull(ductile().map(([strain, stress]) => [strain + shift, stress] as const))
      const base = pull(ductile())
      for (const key of ['proofStrength', 'tensileStrength', 'extensionAtMaximum', 'uniformElongation', 'elongation']) expect(moved.value(key)).toBeCloseTo(base.value(key), 4)
    }), { numRuns: 30 })
  })

  it('keep to a sticking extensometer, to grips that slip and to an unloading in between', () => {
    const smooth = rambergOsgood()
    const sticking = smooth.map(([, stress], i) => [smooth[i - (i % 10)]?.[0] ?? 0, stress] as const)
    const unloaded = smooth.flatMap(([strain, stress], i) => {
      if (i !== 250) return [[strain, stress] as const]
      const back = Array.from({ length: 20 }, (_, k) => [strain - (k * 8) / 205_000, stress - k * 8] as const)
      return [...back, ...back.toReversed()]
    })
    for (const points of [sticking, unloaded]) {
      const { value, codes } = pull(points)
      expect(Math.abs(value('proofStrength') / 400 - 1)).toBeLessThan(0.003)
      expect(codes).not.toContain('discontinuous-yielding')
    }
  })

  it('stand on what is left when the first points are missing', () => {
    const { value } = pull(rambergOsgood({ n: 20 }).filter(([, stress]) => stress > 160))
    expect(Math.abs(value('proofStrength') / 400 - 1)).toBeLessThan(0.003)
  })

  it('are missing, and said to be, without a rise to fit', () => {
    const { keys, codes } = pull(rambergOsgood(), { parameters: { elasticWindow: { fromMPa: 3000, toMPa: 4000 } } })
    expect(keys).toEqual(['area', 'tensileStrength'])
    expect(codes).toContain('elastic-fit')
  })
})

describe('maximum, fracture and elongation', () => {
  it('takes the middle of the plateau where the force stays at its maximum', () => {
    const [rise, fall] = [ductile().filter(([strain]) => strain <= 0.16), ductile().filter(([strain]) => strain > 0.16)]
    const flat = Array.from({ length: 41 }, (_, i) => [0.16 + 0.001 * i, 450] as const)
    const { value } = pull([...rise, ...flat, ...fall.map(([strain, stress]) => [strain + 0.04, stress] as const)])
    expect(value('extensionAtMaximum')).toBeCloseTo(18, 6)
  })

  it('takes the elongation from the curve only while the extensometer stayed on', () => {
    expect(pull(ductile()).value('elongation')).toBeCloseTo(28 - (100 * 315) / 200_000, 4)
    const at = ductile().findIndex(([strain]) => strain > 0.05)
    const stopped = pull(ductile().map(([strain, stress], i) => [i < at ? strain : 0.05, stress] as const))
    expect(stopped.codes).toContain('curve-too-short')
    expect(stopped.keys).not.toContain('elongation')
    expect(stopped.keys).not.toContain('uniformElongation')
    expect(stopped.value('tensileStrength')).toBeCloseTo(450, 9)
    const removed = pull(ductile().slice(0, at))
    expect(removed.codes).toEqual(expect.arrayContaining(['no-maximum', 'curve-too-short']))
  })

  it('prefers the marks to the curve, and a typed maximum where the record stopped early', () => {
    const marks = pull(ductile(), { parameters: { originalGaugeLengthMm: 50 }, readings: { finalGaugeLengthMm: 63 } })
    expect(marks.reported('elongation')).toBe('26.0 %')
    const early = pull(rambergOsgood(), { readings: { maximumForceN: 600 * area, finalGaugeLengthMm: 60 }, parameters: { originalGaugeLengthMm: 50 } })
    expect(early.value('tensileStrength')).toBeCloseTo(600, 9)
  })

  it('ends the curve where the force collapses', () => {
    const { value } = pull([...ductile(), [0.279, 100], [0.278, 3], [0.278, 0.4]])
    expect(value('elongation')).toBeCloseTo(28 - (100 * 315) / 200_000, 4)
  })

  it('tells unloading from fracture', () => {
    const loaded = rambergOsgood()
    const [strain, stress] = loaded[loaded.length - 1] ?? [0, 0]
    const down = Array.from({ length: 50 }, (_, i) => [strain - (stress * (i + 1)) / 50 / 205_000, stress - (stress * (i + 1)) / 50] as const)
    const { codes, keys } = pull([...loaded, ...down])
    expect(codes).toContain('no-maximum')
    expect(keys).not.toContain('elongation')
  })

  it('does not take an early maximum with necking for a yield point', () => {
    const points = [...Array.from({ length: 200 }, (_, i) => [(4 * i) / 200_000, 4 * i] as const), ...Array.from({ length: 300 }, (_, i) => [0.004 + 0.0002 * i, 800 - 200 * (i / 300) ** 2] as const)]
    expect(pull(points).keys).not.toContain('upperYield')
  })
})

describe('sizes, marks and forces by hand', () => {
  const hand = { maximumForceN: 79_560, proofForceN: 71_150, finalGaugeLengthMm: 57.75, finalDiametersMm: [6.42] }
  const round = { section: { shape: 'round', diametersMm: [10.01, 10, 10] }, originalGaugeLengthMm: 50 }

  it('gives every result in the fixed order, each derivation ending in what is reported', () => {
    const { keys, reported, results } = found(round, hand)
    expect(keys).toEqual(['area', 'proofStrength', 'tensileStrength', 'elongation', 'reductionOfArea', 'yieldRatio'])
    expect(reported('area')).toBe('78.59 mm²')
    expect(reported('proofStrength')).toBe('905 MPa')
    expect(reported('tensileStrength')).toBe('1012 MPa')
    expect(reported('elongation')).toBe('15.5 %')
    expect(reported('reductionOfArea')).toBe('59 %')
    expect(reported('yieldRatio')).toBe('0.894')
    for (const result of [...results, ...pull(ductile()).results]) expect(result.derivation.at(-1)?.reported).toBe(result.reported)
  })

  it('does not mind the order of the diameters', () => {
    fc.assert(fc.property(fc.array(fc.double({ min: 9.9, max: 10.1, noNaN: true }), { minLength: 2, maxLength: 6 }), (diameters) => {
      const area = (diametersMm: number[]) => found({ section: { shape: 'round', diametersMm } }, hand).value('area')
      expect(area(diameters.toReversed())).toBeCloseTo(area(diameters), 10)
    }))
  })

  it.each([
    ['ISO 6892-1', 16.6, true], ['ISO 6892-1', 16.7, false], ['ASTM E8/E8M', 12.4, true], ['ASTM E8/E8M', 12.5, false],
  ])('%s, fracture %d mm from the mark', (standard, fractureFromNearerMarkMm, isOutside) => {
    expect(found({ ...round, standard }, { ...hand, fractureFromNearerMarkMm }).codes.includes('fracture-outside')).toBe(isOutside)
  })

  it('says which gauge length is missing', () => {
    const { keys, checks } = found({ section: round.section }, hand)
    expect(keys).not.toContain('elongation')
    expect(checks).toContainEqual(expect.objectContaining({ code: 'gauge-length-missing', message: expect.stringContaining('original gauge length') }))
  })

  it.each([
    [{ finalGaugeLengthMm: 49 }, 'final-gauge-length'], [{ finalDiametersMm: [11] }, 'final-section'], [{ fractureFromNearerMarkMm: 40 }, 'fracture-position'],
  ])('refuses what cannot be: %j', (wrong, code) => {
    expect(found(round, { ...hand, ...wrong }).checks).toContainEqual(expect.objectContaining({ code, severity: 'error' }))
  })

  it('carries the uncertainty to the tensile strength', () => {
    const { results } = tensile.evaluate({ parameters: { standard: 'ISO 6892-1', ...round }, readings: hand, uncertainty: { components: [{ name: 'frame', standardUncertainty: 3 }, { name: 'area', standardUncertainty: 4 }] } })
    expect(results.find((one) => one.key === 'tensileStrength')?.expandedUncertainty).toBeCloseTo(10, 3)
  })
})

describe('input that cannot be read', () => {
  const section = { shape: 'round', diametersMm: [10] }
  const path = (parameters: object, readings: unknown) => {
    try {
      tensile.evaluate({ parameters: { standard: 'ISO 6892-1', ...parameters }, readings })
    } catch (problem) {
      if (problem instanceof ZodError) return problem.issues.map((issue) => issue.path.join('.'))
    }
    return []
  }
  it.each([
    ['unequal columns', { section }, { curve: { extensionMm: [0, 1, 2], forceN: [0, 1, 2, 3] } }, 'readings.curve.extensionMm'],
    ['a missing column', { section }, { curve: { forceN: [0, 1, 2] } }, 'readings.curve.extensionMm'],
    ['not a number', { section }, { curve: { extensionMm: [0, 1, 2], forceN: [0, NaN, 2] } }, 'readings.curve.forceN.1'],
    ['text', { section }, { curve: { extensionMm: [0, 1, '2'], forceN: [0, 1, 2] } }, 'readings.curve.extensionMm.2'],
    ['too few points', { section }, { curve: { extensionMm: [], forceN: [0, 1, 2] } }, 'readings.curve.extensionMm'],
    ['too many points', { section }, { curve: { extensionMm: new Array(2_000_001).fill(0), forceN: [0, 1, 2] } }, 'readings.curve.extensionMm'],
    ['an absurd force', { section }, { maximumForceN: 1e12 }, 'readings.maximumForceN'],
    ['a negative length', { section }, { finalGaugeLengthMm: -1 }, 'readings.finalGaugeLengthMm'],
    ['a negative diameter', { section: { shape: 'round', diametersMm: [-10] } }, {}, 'parameters.section.diametersMm.0'],
    ['an absurd diameter', { section: { shape: 'round', diametersMm: [10_000] } }, {}, 'parameters.section.diametersMm.0'],
    ['a window upside down', { section, elasticWindow: { fromMPa: 300, toMPa: 200 } }, {}, 'parameters.elasticWindow.toMPa'],
    ['an unknown key', { section }, { forceN: 3 }, 'readings'],
  ])('%s', (_name, parameters, readings, expected) => {
    expect(path(parameters, readings)).toEqual([expected])
  })

  it('never answers with something that is no number', () => {
    const value = fc.oneof(fc.double({ min: -50, max: 2000, noNaN: true }), fc.constantFrom(0, 1, -1))
    fc.assert(fc.property(fc.array(fc.tuple(value, value), { minLength: 3, maxLength: 60 }), (rows) => {
      const curve = { extensionMm: rows.map(([x]) => x), forceN: rows.map(([, y]) => 100 * y) }
      const { results } = found({ section, extensometerGaugeLengthMm: 50 }, { curve })
      for (const one of results) expect(Number.isFinite(one.value)).toBe(true)
    }), { numRuns: 300 })
  })
})
