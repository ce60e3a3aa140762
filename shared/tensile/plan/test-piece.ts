import type { Piece } from '../../method/piece.ts'
import { mean } from '../../statistics/mean.ts'
import { sectionArea } from '../section-area.ts'
import type { Section, TensileParameters } from '../tensile-parameters.ts'

type Standard = TensileParameters['standard']

/** Usual machined round test pieces: diameter and the least stock that its gripped ends take, mm. From memory of DIN 50125 and ASTM E8/E8M. */
export const roundPieces: Record<Standard, readonly { diameterMm: number; stockMm: number }[]> = {
  'ISO 6892-1': [{ diameterMm: 10, stockMm: 16 }, { diameterMm: 8, stockMm: 12 }, { diameterMm: 6, stockMm: 10 }, { diameterMm: 5, stockMm: 8 }, { diameterMm: 4, stockMm: 6 }],
  'ASTM E8/E8M': [{ diameterMm: 12.5, stockMm: 20 }, { diameterMm: 9, stockMm: 14 }, { diameterMm: 6, stockMm: 10 }, { diameterMm: 4, stockMm: 7 }, { diameterMm: 2.5, stockMm: 5 }],
}

/** Width and fixed gauge length of the usual flat test piece, mm: ISO 6892-1 Annex B type 2 and wider, ASTM sheet-type. */
const flat: Record<Standard, { widthMm: number; gaugeLengthMm: number }> = {
  'ISO 6892-1': { widthMm: 20, gaugeLengthMm: 80 },
  'ASTM E8/E8M': { widthMm: 12.5, gaugeLengthMm: 50 },
}

/** Below this thickness ISO uses the fixed gauge lengths of Annex B. */
const THIN = 3

export type TestPiece = { section: Section; originalGaugeLengthMm: number }

/**
 * Original gauge length of a proportional test piece, mm. ISO: 5.65 √S0, to the nearest 5 mm where that changes it by less than a tenth, and 11.3 √S0
 * where it would fall below 20 mm (ISO 6892-1, clause 8 and Annex D). ASTM E8: four diameters of a round test piece.
 * @example proportionalGaugeLength({ shape: 'round', diametersMm: [10] }, 'ISO 6892-1') // 50
 */
export function proportionalGaugeLength(section: Section, standard: Standard): number {
  if (standard === 'ASTM E8/E8M' && section.shape === 'round') return tidy(4 * mean(section.diametersMm))
  const root = Math.sqrt(sectionArea(section).value)
  const length = 5.65 * root
  const exact = length < 20 ? 11.3 * root : length
  const rounded = 5 * Math.round(exact / 5)
  return rounded > 0 && Math.abs(rounded - exact) < 0.1 * exact ? rounded : tidy(exact)
}

function tidy(lengthMm: number): number {
  return Number(lengthMm.toFixed(2))
}

/** The smallest dimension across a piece, if it is known. */
export function thickest({ diameterMm, thicknessMm, widthMm }: Piece): number | undefined {
  const across = [thicknessMm, widthMm].filter((size) => size !== undefined)
  return diameterMm ?? (across.length > 0 ? Math.min(...across) : undefined)
}

/** The usual test piece out of what was sent: full thickness of sheet and tube walls, the largest round that fits of everything else. */
export function usualTestPiece(piece: Piece | undefined, standard: Standard): TestPiece {
  const { form, thicknessMm, diameterMm } = piece ?? {}
  if (thicknessMm !== undefined && (form === 'sheet' || form === 'tube' || (form === 'plate' && thicknessMm < 10))) {
    const { widthMm, gaugeLengthMm } = flat[standard]
    const section: Section = { shape: 'rectangular', thicknessesMm: [thicknessMm], widthsMm: [Math.min(widthMm, piece?.widthMm ?? widthMm)] }
    const isFixed = thicknessMm < THIN || standard === 'ASTM E8/E8M'
    return { section, originalGaugeLengthMm: isFixed ? gaugeLengthMm : proportionalGaugeLength(section, standard) }
  }
  const stock = piece && thickest(piece)
  const fitting = stock === undefined ? roundPieces[standard][0] : roundPieces[standard].find(({ stockMm }) => stockMm <= stock)
  if (fitting && form !== 'wire') return sized(fitting.diameterMm, standard)
  return diameterMm === undefined ? sized(10, standard) : unmachined(diameterMm, standard)
}

/** The whole section of a thin bar or wire. Below 4 mm ISO 6892-1 Annex C takes a fixed gauge length of 100 mm. */
export function unmachined(diameterMm: number, standard: Standard): TestPiece {
  return diameterMm < 4 && standard === 'ISO 6892-1'
    ? { section: { shape: 'round', diametersMm: [diameterMm] }, originalGaugeLengthMm: 100 }
    : sized(diameterMm, standard)
}

export function sized(diameterMm: number, standard: Standard): TestPiece {
  const section: Section = { shape: 'round', diametersMm: [diameterMm] }
  return { section, originalGaugeLengthMm: proportionalGaugeLength(section, standard) }
}
