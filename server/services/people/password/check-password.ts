import { Problem } from '../../../../shared/problems.ts'
import { commonPasswords } from './common-passwords.ts'

const product = ['crosshead', 'hardness', 'tensile']
/** A password that holds a word about its owner is refused when little else is left of it. */
const leftAtLeast = 8

const plain = (text: string) => text.toLowerCase().normalize('NFKC')

/**
 * Refuses a password that is common, one pattern over and over, or made of words about its owner, the company or the
 * product; `field` is the name of its input.
 */
export function checkPassword(password: string, about: { name: string; email: string; company: string }, field: string): void {
  const refuse = (why: string): never => {
    throw new Problem('not-acceptable', 'this password is too easy to guess', { [field]: why })
  }
  const typed = plain(password)
  if (isCommon(typed)) refuse('one of the passwords that are tried first; choose another')
  if (isPattern(typed)) refuse('the same few characters over and over, or a row of the keyboard; choose another')
  const rest = contextWords(about).reduce((left, word) => left.replaceAll(word, ''), typed)
  if (rest.length < typed.length && rest.length < leftAtLeast) refuse('made of your name, your address, the company or the product; choose another')
}

/** A common password is still common with digits and signs around it. */
function isCommon(typed: string): boolean {
  return commonPasswords.has(typed) || commonPasswords.has(typed.replace(/^[^a-z]{1,6}/, '')) || commonPasswords.has(typed.replace(/[^a-z]{1,6}$/, ''))
}

const rows = ['01234567890', '09876543210', 'abcdefghijklmnopqrstuvwxyz', 'qwertyuiopasdfghjklzxcvbnm', 'qwertzuiopasdfghjklyxcvbnm']

function isPattern(typed: string): boolean {
  if (new Set(typed).size < 5) return true
  if (rows.some((row) => row.repeat(13).includes(typed))) return true
  return [1, 2, 3, 4, 5, 6].some((length) => typed.slice(0, length).repeat(Math.ceil(typed.length / length)).startsWith(typed))
}

/** Longest first, so that a whole name goes before its parts. */
function contextWords({ name, email, company }: { name: string; email: string; company: string }): string[] {
  const words = [name, email, company].flatMap((text) => [plain(text), ...plain(text).split(/[^\p{L}\p{N}]+/u)])
  return [...new Set([...words, ...product])].filter((word) => word.length >= 4).sort((a, b) => b.length - a.length)
}
