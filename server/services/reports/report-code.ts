import { createHash, randomBytes, timingSafeEqual } from 'node:crypto'

/** Digits and letters that are not mistaken for one another: no I, L, O and U. 32 of them, so 12 hold 60 bits. */
const alphabet = '0123456789ABCDEFGHJKMNPQRSTVWXYZ'

/** A random code of 60 bits in three groups: "K7Q2-94MD-XV3T". */
export function newReportCode(): string {
  const characters = [...randomBytes(12)].map((byte) => alphabet[byte % alphabet.length]!).join('')
  return characters.replace(/(.{4})(?=.)/g, '$1-')
}

/** A code as it may be typed: any case, with or without hyphens, O for 0, I and L for 1. */
export function readReportCode(typed: string): string {
  return typed.toUpperCase().replace(/[^0-9A-Z]/g, '').replace(/O/g, '0').replace(/[IL]/g, '1')
}

/** Whether a typed code is this one, in the same time however much of it is right. */
export function isReportCode(typed: string, code: string): boolean {
  const digest = (text: string) => createHash('sha256').update(readReportCode(text)).digest()
  return timingSafeEqual(digest(typed), digest(code))
}
