import type { Misfit } from '../../method/method.ts'
import type { Piece } from '../../method/piece.ts'
import { mean } from '../../statistics/mean.ts'
import { plain } from '../section-area.ts'
import type { TensileParameters } from '../tensile-parameters.ts'
import { roundPieces, sized, thickest, unmachined, usualTestPiece, type TestPiece } from './test-piece.ts'

/** Thinnest product that the methods take, mm: ISO 6892-1 Annex B begins at 0.1 mm, ASTM E8/E8M at 0.13 mm. Thinner is foil. */
const THINNEST = { 'ISO 6892-1': 0.1, 'ASTM E8/E8M': 0.13 } as const

type Ordered = Pick<TensileParameters, 'standard'> & { section?: TensileParameters['section'] }

/** Whether the test piece can be cut from what was sent, with the sizes that can. */
export function misfits({ standard, section }: Ordered, piece: Piece): Misfit[] {
  const { form, thicknessMm, widthMm } = piece
  if ((form === 'sheet' || form === 'plate' || form === 'tube') && thicknessMm !== undefined && thicknessMm < THINNEST[standard]) {
    return [{ message: `${plain(thicknessMm)} mm is too thin: ${standard} takes ${THINNEST[standard]} mm or more`, cures: [] }]
  }
  if (!section || section.shape === 'area') return []
  if (section.shape === 'rectangular') {
    const [thickness, width] = [mean(section.thicknessesMm), mean(section.widthsMm)]
    const stock = thicknessMm ?? piece.diameterMm
    if (stock !== undefined && thickness > stock) return [misfit(`a test piece ${plain(thickness)} mm thick cannot be cut from ${plain(stock)} mm`, [usualTestPiece(piece, standard)])]
    if (widthMm !== undefined && width > widthMm) return [misfit(`a test piece ${plain(width)} mm wide cannot be cut from ${plain(widthMm)} mm`, [usualTestPiece(piece, standard)])]
    return []
  }
  const stock = thickest(piece)
  const diameter = mean(section.diametersMm)
  const needed = roundPieces[standard].find(({ diameterMm }) => diameterMm === diameter)?.stockMm ?? diameter
  if (stock === undefined || needed <= stock || isWhole(piece, diameter)) return []
  const smaller = roundPieces[standard].filter(({ stockMm, diameterMm }) => stockMm <= stock && diameterMm < diameter).slice(0, 2)
  const cures = form === 'sheet' || (form === 'plate' && stock < 10) || form === 'tube' ? [usualTestPiece(piece, standard)] : smaller.map(({ diameterMm }) => sized(diameterMm, standard))
  if (cures.length === 0 && piece.diameterMm !== undefined) cures.push(unmachined(piece.diameterMm, standard))
  return [misfit(`${plain(stock)} mm is too small for a round test piece of ${plain(diameter)} mm, whose ends take ${plain(needed)} mm`, cures)]
}

function isWhole({ diameterMm }: Piece, diameter: number): boolean {
  return diameterMm !== undefined && Math.abs(diameterMm - diameter) < 0.02 * diameterMm
}

function misfit(message: string, pieces: TestPiece[]): Misfit {
  return { message, cures: pieces.map((one) => ({ label: `Use ${sizeOf(one.section)}, L0 ${plain(one.originalGaugeLengthMm)} mm`, parameters: one })) }
}

/** A test piece in words: "round 10 mm", "flat 6 × 20 mm". */
export function sizeOf(section: TensileParameters['section']): string {
  switch (section.shape) {
    case 'round':
      return `round ${plain(rounded(mean(section.diametersMm)))} mm`
    case 'rectangular':
      return `flat ${plain(rounded(mean(section.thicknessesMm)))} × ${plain(rounded(mean(section.widthsMm)))} mm`
    case 'area':
      return `section ${plain(section.areaMm2)} mm²`
  }
}

function rounded(lengthMm: number): number {
  return Number(lengthMm.toFixed(2))
}
