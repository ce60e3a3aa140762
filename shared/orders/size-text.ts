import type { Piece } from '../method/piece.ts'

/** The size of a sample as the trade writes it, in mm: "Ø 60", "45 × 90", a sheet "0.80", a tube "Ø 60 × 5"; empty when none is known. */
export function sizeText({ form, diameterMm, thicknessMm, widthMm }: Piece): string {
  const thickness = thicknessMm === undefined ? undefined : form === 'sheet' ? thicknessMm.toFixed(2) : plain(thicknessMm)
  const across = diameterMm === undefined ? undefined : `Ø ${plain(diameterMm)}`
  const width = widthMm === undefined ? undefined : plain(widthMm)
  return [across, thickness, width].filter((part) => part !== undefined).join(' × ')
}

function plain(mm: number): string {
  return String(Number(mm.toFixed(3)))
}
