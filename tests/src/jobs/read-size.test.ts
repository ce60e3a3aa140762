import { describe, expect, it } from 'vitest'
import { productForms, type Piece } from '../../../shared/method/piece.ts'
import { sizeFault } from '../../../shared/orders/size-fault.ts'
import { sizeText } from '../../../shared/orders/size-text.ts'
import { readSize } from '../../../src/components/jobs/draft/read-size.ts'

describe('a size as the trade writes it', () => {
  it.each<[Piece['form'], string, Omit<Piece, 'form'>]>([
    ['bar', 'Ø 60', { diameterMm: 60 }], ['bar', '60', { diameterMm: 60 }], ['bar', 'dia. 60 mm', { diameterMm: 60 }], ['bar', '45 × 90', { thicknessMm: 45, widthMm: 90 }],
    ['sheet', '0,80', { thicknessMm: 0.8 }], ['plate', '12x200', { thicknessMm: 12, widthMm: 200 }], ['tube', '60*5', { diameterMm: 60, thicknessMm: 5 }], ['tube', '5 × 60', { diameterMm: 60, thicknessMm: 5 }],
    ['forging', '45', { thicknessMm: 45 }], ['forging', 'Ø 45', { diameterMm: 45 }], ['wire', '.5', { diameterMm: 0.5 }], ['bar', '', {}],
  ])('of a %s: "%s"', (form, text, lengths) => {
    expect(readSize(form, text)).toEqual({ piece: { form, ...lengths } })
  })

  it.each<[Piece['form'], string, string]>([
    ['bar', 'abc', 'is no size'], ['bar', '60 ×', 'is no size'], ['sheet', '0', 'above 0'], ['plate', '3000', 'at most 2000'], ['wire', '1 × 2', 'takes one'], ['plate', '1 × 2 × 3', 'takes two at most'],
  ])('is refused of a %s: "%s"', (form, text, words) => {
    expect(readSize(form, text).problem).toContain(words)
  })

  it('reads back what is shown', () => {
    const sizes = [{ diameterMm: 60 }, { thicknessMm: 0.8 }, { thicknessMm: 45, widthMm: 90 }, { diameterMm: 60, thicknessMm: 5 }]
    for (const form of productForms) {
      for (const size of sizes) {
        if (sizeFault({ form, ...size }) || (form === 'wire' && 'thicknessMm' in size)) continue
        expect(readSize(form, sizeText({ form, ...size }))).toEqual({ piece: { form, ...size } })
      }
    }
  })
})
