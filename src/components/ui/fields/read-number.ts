/** What a typed text means: a number, nothing, or why it cannot be read. */
export type ReadNumber = { value: number | undefined; problem?: string }

/**
 * Reads a number as people type it. Comma and point both mark decimals, and spaces may group. Where one mark could be either
 * ("1,234" in English, "1.234" in German) it is refused instead of guessed: a guess would be wrong a thousandfold.
 */
export function readNumber(text: string, locale: string): ReadNumber {
  const plain = text.replace(/[\s\u00a0\u2009\u202f']/g, '').replace(/[−–]/g, '-')
  if (plain === '') return { value: undefined }
  const marks = plain.match(/[.,]/g) ?? []
  const group = decimalMark(locale) === ',' ? '.' : ','
  if (marks.length > 1) return { value: undefined, problem: 'Type the number without marks between thousands.' }
  if (marks[0] === group && /^-?[1-9]\d{0,2}[.,]\d{3}$/.test(plain)) {
    const whole = plain.replace(group, '')
    return { value: undefined, problem: `${text.trim()} can be read two ways: type ${whole} or ${plain.replace(group, decimalMark(locale))}.` }
  }
  if (!/^[-+]?(\d+[.,]?\d*|[.,]\d+)(e[-+]?\d+)?$/i.test(plain)) return { value: undefined, problem: `${text.trim()} is not a number.` }
  return { value: Number(plain.replace(',', '.')) }
}

export function decimalMark(locale: string): string {
  return new Intl.NumberFormat(locale).formatToParts(1.5).find((part) => part.type === 'decimal')?.value ?? '.'
}

/** How many decimals a step asks for: 0.01 is 2, 5 is 0. */
export function stepDecimals(step: number): number {
  const text = String(step)
  if (text.includes('e-')) return Number(text.split('e-')[1])
  return text.split('.')[1]?.length ?? 0
}
