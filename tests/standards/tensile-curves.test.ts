import { describe, expect, it } from 'vitest'
import { tensile } from '../../shared/tensile/tensile.ts'
import { curveOf, recordText } from './records/read-record.ts'

// Closed forms: records/constructed, made from the models named in expected.json, with the tolerances given there.
const { cases } = JSON.parse(recordText('constructed/expected.json'))

function evaluate(name: string, areaMm2: number, gaugeLengthMm: number, standard = 'ISO 6892-1', more: object = {}) {
  const curve = curveOf(`constructed/${name}.csv`, areaMm2, gaugeLengthMm)
  const parameters = { standard, section: { shape: 'area', areaMm2 }, extensometerGaugeLengthMm: gaugeLengthMm, ...more }
  const { results, checks } = tensile.evaluate({ parameters, readings: { curve } })
  return { value: (key: string) => results.find((one) => one.key === key)?.value ?? NaN, keys: results.map((one) => one.key), codes: checks.map((one) => one.code), results, checks }
}

describe('curves constructed from closed forms', () => {
  for (const one of cases) it(one.case, () => {
    const name = one.case
    const { expected, tolerance = {}, params } = one
    const area = params.S0_mm2 ?? 50
    const gauge = params.Le_mm ?? 40
    const found = evaluate(name, area, gauge)
    const within = (key: string, wanted: number | undefined, most: number) => wanted !== undefined && expect(Math.abs(found.value(key) - wanted), key).toBeLessThanOrEqual(most)
    within('slope', expected.E_MPa, (tolerance.E_rel ?? 0.01) * expected.E_MPa)
    for (const [offset, wanted] of [[0.1, expected.Rp0_1], [0.2, expected.Rp0_2], [1, expected.Rp1_0]] as const) {
      if (wanted === undefined) continue
      const proof = evaluate(name, area, gauge, 'ISO 6892-1', { offsetPercent: offset }).value('proofStrength')
      expect(Math.abs(proof - wanted), `Rp${offset}`).toBeLessThanOrEqual(tolerance.Rp_rel * wanted)
    }
    within('upperYield', expected.ReH, tolerance.ReH ?? 0.5)
    within('lowerYield', expected.ReL_ignoring_transient, tolerance.ReL)
    within('yieldPointExtension', expected.Ae_percent_from_ReH_to_start_of_hardening, tolerance.Ae_abs_percent)
    within('tensileStrength', expected.Rm, tolerance.Rm ?? (tolerance.Rm_rel ?? 0) * expected.Rm)
    within('extensionAtMaximum', expected.Agt_percent, tolerance.Ag_abs_percent)
    within('uniformElongation', expected.Ag_percent, tolerance.Ag_abs_percent)
    within('elongation', expected.A_from_extensometer_percent, 0.05)
    expect(found.codes.includes('discontinuous-yielding')).toBe(one.discontinuous_yielding)
    expect(found.keys.includes('upperYield')).toBe(one.discontinuous_yielding)
    if (expected.Rm_last_point !== undefined) {
      expect(found.codes).toEqual(expect.arrayContaining(['no-maximum', 'curve-too-short']))
      expect(found.keys).not.toEqual(expect.arrayContaining(['uniformElongation']))
    }
    if (expected.zero_shift_strain !== undefined) {
      const line = found.results.find((result) => result.key === 'slope')?.derivation[0]?.formula ?? ''
      const shift = Number(/e - ([\d.]+) %/.exec(line)?.[1]) / 100
      expect(Math.abs(shift - expected.zero_shift_strain)).toBeLessThanOrEqual(tolerance.zero_shift_abs)
    }
  })

  it('rounds a yield point as ISO 6892-1 does', () => {
    const { results } = evaluate('lueders_a', 78.54, 50)
    const reported = Object.fromEntries(results.map((one) => [one.key, one.reported]))
    expect(reported).toMatchObject({ upperYield: '355 MPa', lowerYield: '327 MPa', tensileStrength: '495 MPa', yieldPointExtension: '1.7 %', elongation: '29.5 %' })
  })

  // ISO 6892-1, 3.10.1, from memory: Rm is the later maximum, and that it lies below ReH is told; ASTM reports the largest stress carried.
  it('says when nothing gets above the upper yield point', () => {
    const iso = evaluate('no_hardening_after_ReH', 50, 40)
    expect(iso.value('tensileStrength')).toBeCloseTo(488, 1)
    expect(iso.codes).toContain('maximum-at-upper-yield')
    const astm = evaluate('no_hardening_after_ReH', 50, 40, 'ASTM E8/E8M')
    expect(astm.value('tensileStrength')).toBeCloseTo(520, 1)
    expect(astm.codes).toContain('maximum-at-upper-yield')
  })

  it('counts the elastic part in the uniform elongation of ASTM', () => {
    const astm = evaluate('considere_steel', 50.27, 40, 'ASTM E8/E8M')
    expect(astm.value('uniformElongation')).toBe(astm.value('extensionAtMaximum'))
    const iso = evaluate('considere_steel', 50.27, 40)
    expect(iso.value('extensionAtMaximum') - iso.value('uniformElongation')).toBeCloseTo((100 * 439.1156) / 200000, 3)
  })

  it('fits the elastic line between stresses given by hand', () => {
    const { value, results } = evaluate('toe_a', 50, 40, 'ISO 6892-1', { elasticWindow: { fromMPa: 100, toMPa: 220 } })
    expect(Math.abs(value('slope') / 205000 - 1)).toBeLessThan(0.01)
    expect(results.find((one) => one.key === 'slope')?.derivation[0]?.text).toContain('from 100.0 to 220.0 MPa, chosen by hand')
  })
})
