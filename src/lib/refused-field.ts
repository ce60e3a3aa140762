import { Refusal } from './refusal.ts'

/** What is wrong with one input, as a sentence: what its own form says first, then the server. `refusedField(save.error, 'email', errors.email)`. */
export function refusedField(error: unknown, field: string, own?: { message?: string }): string | undefined {
  const said = own?.message ?? (error instanceof Refusal ? error.fields[field] : undefined)
  return said === undefined ? undefined : asSentence(said)
}

/** The refusal as a whole, unless its fields say it all beside their inputs: give the names of those that do. */
export function refusalWords(error: unknown, shownBeside: readonly string[] = []): string | undefined {
  if (!(error instanceof Error)) return undefined
  const fields = error instanceof Refusal ? Object.keys(error.fields) : []
  return fields.length > 0 && fields.every((field) => shownBeside.includes(field)) ? undefined : asSentence(error.message)
}

/** "at least 12 characters" is "At least 12 characters." */
export function asSentence(text: string): string {
  const whole = /[.!?]$/.test(text) ? text : `${text}.`
  return whole.charAt(0).toUpperCase() + whole.slice(1)
}
