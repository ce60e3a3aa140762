import { describe, expect, it } from 'vitest'
import { tensile } from '../../../shared/tensile/tensile.ts'

describe('the test piece at order', () => {
  it.each([
    [undefined, 'ISO 6892-1, round 10 mm, L0 50 mm'],
    [{ form: 'bar', diameterMm: 60 }, 'ISO 6892-1, round 10 mm, L0 50 mm'],
    [{ form: 'bar', diameterMm: 9 }, 'ISO 6892-1, round 5 mm, L0 25 mm'],
    [{ form: 'wire', diameterMm: 2 }, 'ISO 6892-1, round 2 mm, L0 100 mm'],
    [{ form: 'sheet', thicknessMm: 0.8, widthMm: 100 }, 'ISO 6892-1, flat 0.8 × 20 mm, L0 80 mm'],
  ] as const)('%j gives %s', (piece, summary) => {
    const parameters = tensile.suggest(piece)
    expect(tensile.summary(parameters)).toBe(summary)
    if (piece) expect(tensile.misfits(parameters, piece)).toEqual([])
  })

  it('refuses a bar that is too small, with sizes that fit', () => {
    const piece = { form: 'bar', diameterMm: 11 } as const
    const parameters = { standard: 'ISO 6892-1', section: { shape: 'round', diametersMm: [10] }, originalGaugeLengthMm: 50 }
    const [misfit] = tensile.misfits(parameters, piece)
    expect(misfit?.cures.map((cure) => cure.label)).toEqual(['Use round 6 mm, L0 30 mm', 'Use round 5 mm, L0 25 mm'])
    for (const cure of misfit?.cures ?? []) expect(tensile.misfits({ ...parameters, ...cure.parameters }, piece)).toEqual([])
  })

  it('refuses foil', () => {
    expect(tensile.misfits({ standard: 'ASTM E8/E8M' }, { form: 'sheet', thicknessMm: 0.12 })).toHaveLength(1)
    expect(tensile.misfits({ standard: 'ISO 6892-1' }, { form: 'sheet', thicknessMm: 0.12 })).toEqual([])
  })

  it('asks for a frame with force enough', () => {
    const force = (diameter: number) => tensile.needs({ standard: 'ISO 6892-1', section: { shape: 'round', diametersMm: [diameter] } }).find((step) => step.kind === 'pull')?.needs
    expect(force(10)).toEqual({ forceKn: 95, diameterMm: 10 })
    expect(force(20)).toEqual({ forceKn: 377, diameterMm: 20 })
  })
})
