import type { Piece } from '../../../../shared/method/piece.ts'

type Lengths = Omit<Piece, 'form'>
const longest = 2000

/**
 * A size as the trade writes it, in mm: "Ø 60", "60", "45 × 90", "0.80", "60x5". One number is the diameter of what is round
 * and the thickness of what is flat; two are thickness and width, of a tube diameter and wall. Comma and point both mark decimals.
 * An empty text is a size that is not known yet.
 */
export function readSize(form: Piece['form'], text: string): { piece: Piece; problem?: undefined } | { piece?: undefined; problem: string } {
  const plain = text.toLowerCase().replace(/mm\b/g, '').replace(/\b(dia(meter)?|thk|thick(ness)?)\b\.?/g, (word) => (word.startsWith('dia') ? 'ø' : '')).replace(/⌀|phi/g, 'ø').trim()
  if (plain === '') return { piece: { form } }
  const isRound = plain.startsWith('ø')
  const parts = plain.replace(/^ø\s*/, '').split(/[x×*]/).map((part) => part.trim())
  const numbers = parts.map((part) => (/^\d+([.,]\d+)?$|^[.,]\d+$/.test(part) ? Number(part.replace(',', '.')) : NaN))
  if (numbers.some(Number.isNaN)) return { problem: `“${text.trim()}” is no size in mm: type Ø 60, 45 × 90 or 0.80` }
  if (numbers.some((number) => number <= 0 || number > longest)) return { problem: `“${text.trim()}” is outside of what is taken: above 0, at most ${longest} mm` }
  const lengths = lengthsOf(form, numbers, isRound)
  return lengths ? { piece: { form, ...lengths } } : { problem: `“${text.trim()}” gives ${numbers.length} lengths; a ${form} takes ${form === 'wire' ? 'one' : 'two at most'}` }
}

function lengthsOf(form: Piece['form'], numbers: readonly number[], isRound: boolean): Lengths | undefined {
  const [first, second, third] = numbers
  if (first === undefined) return {}
  if (form === 'tube' && second !== undefined && third === undefined) return { diameterMm: Math.max(first, second), thicknessMm: Math.min(first, second) }
  if (isRound || form === 'wire' || form === 'tube' || (form === 'bar' && second === undefined)) {
    if (second === undefined) return { diameterMm: first }
    return form === 'wire' || form === 'tube' || third !== undefined ? undefined : { diameterMm: first, thicknessMm: second }
  }
  if (third !== undefined) return undefined
  return second === undefined ? { thicknessMm: first } : { thicknessMm: first, widthMm: second }
}
