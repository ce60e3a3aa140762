import type { Piece, productForms } from '../method/piece.ts'

type Length = 'diameterMm' | 'thicknessMm' | 'widthMm'
const words: Record<Length, string> = { diameterMm: 'diameter', thicknessMm: 'thickness', widthMm: 'width' }

/** The sets of lengths that each form can be given by; one full set is enough. */
const asked: Record<(typeof productForms)[number], readonly (readonly Length[])[]> = {
  bar: [['diameterMm'], ['thicknessMm', 'widthMm']],
  plate: [['thicknessMm']],
  sheet: [['thicknessMm']],
  tube: [['diameterMm', 'thicknessMm']],
  wire: [['diameterMm']],
  forging: [['diameterMm'], ['thicknessMm']],
  casting: [['diameterMm'], ['thicknessMm']],
}

/** What is missing or impossible about a size, with the field to mend it in; null when it will do. */
export function sizeFault(piece: Piece): { field: Length; message: string } | null {
  const sets = asked[piece.form]
  const [first] = sets
  if (first && !sets.some((set) => set.every((length) => piece[length] !== undefined))) {
    const field = first.find((length) => piece[length] === undefined) ?? 'thicknessMm'
    return { field, message: `a ${piece.form} needs its ${sets.map((set) => set.map((length) => words[length]).join(' and ')).join(', or ')}` }
  }
  const { diameterMm, thicknessMm } = piece
  if (piece.form === 'tube' && diameterMm !== undefined && thicknessMm !== undefined && thicknessMm > diameterMm / 2) {
    return { field: 'thicknessMm', message: `a wall of ${thicknessMm} mm is more than half of the diameter of ${diameterMm} mm` }
  }
  return null
}
