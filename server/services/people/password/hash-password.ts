import { hash, verify, type Options } from '@node-rs/argon2'

/** argon2id (the package's own default) with the memory and passes that OWASP gives as a minimum. */
const cost = { memoryCost: 19_456, timeCost: 2, parallelism: 1 } satisfies Options
const current = `$argon2id$v=19$m=${cost.memoryCost},t=${cost.timeCost},p=${cost.parallelism}$`

/** Of a random password that nobody has: checking it takes as long as checking a real one. */
let nobodys: Promise<string> | undefined

export function hashPassword(password: string): Promise<string> {
  return hash(password, cost)
}

/** Whether the password is right; without a hash the answer is no, after the same work. */
export async function isPassword(passwordHash: string | null, password: string): Promise<boolean> {
  nobodys ??= hashPassword(crypto.randomUUID())
  const isRight = await verify(passwordHash ?? (await nobodys), password)
  return isRight && passwordHash !== null
}

/** True for a hash of other cost than today's, which is made anew at the next sign-in. */
export function isOutdated(passwordHash: string): boolean {
  return !passwordHash.startsWith(current)
}
