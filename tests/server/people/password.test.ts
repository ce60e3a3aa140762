import { hash } from '@node-rs/argon2'
import { describe, expect, it } from 'vitest'
import { Problem } from '../../../shared/problems.ts'
import { checkPassword } from '../../../server/services/people/password/check-password.ts'
import { commonPasswords } from '../../../server/services/people/password/common-passwords.ts'
import { hashPassword, isOutdated, isPassword } from '../../../server/services/people/password/hash-password.ts'

const about = { name: 'Ida Neumann', email: 'ida.neumann@brackwater.example', company: 'Tarnwick Materials Testing' }

function refusal(password: string): string | undefined {
  try {
    checkPassword(password, about, 'next')
  } catch (error) {
    if (error instanceof Problem) return error.fields.next
    throw error
  }
}

describe('choosing a password', () => {
  it('refuses what is tried first, in any case and with digits and signs around it', () => {
    for (const password of ['passwordpassword', 'PasswordPassword', 'Password2026!', '123456789012', '1!Password', 'correcthorsebatterystaple', 'qwertyuiop123']) expect(refusal(password)).toMatch(/tried first/)
  })
  it('refuses patterns', () => {
    for (const password of ['aaaaaaaaaaaaaaa', 'abababababab', 'xyz7xyz7xyz7xyz7', 'hijklmnopqrstuv', 'lkjhlkjhlkjh']) expect(refusal(password)).toMatch(/over and over/)
  })
  it('refuses words about the owner, the company and the product', () => {
    for (const password of ['Ida Neumann 26', 'neumann-brackwater', 'tarnwicktesting', 'Crosshead2026', 'ida.neumann@brackwater.example', 'Hardness Testing!']) expect(refusal(password)).toMatch(/made of/)
  })
  it('takes anything else, with whatever characters', () => {
    for (const password of ['seven blue anvils at noon', 'Neumann likes to row at dawn', 'пять синих молотков', '🔨🔩🧲🪛 and a vice', 'x7#Kq!92mZ^w']) expect(refusal(password)).toBeUndefined()
  })
  it('knows enough common ones, all of a length that counts', () => {
    expect(commonPasswords.size).toBeGreaterThanOrEqual(200)
    expect([...commonPasswords].filter((word) => word.length < 8 || word !== word.toLowerCase())).toEqual([])
  })
})

describe('a password\'s hash', () => {
  it('is argon2id of 19 MiB and two passes, different each time, and right for its password only', async () => {
    const one = await hashPassword('seven blue anvils at noon')
    expect(one).toMatch(/^\$argon2id\$v=19\$m=19456,t=2,p=1\$/)
    expect(await hashPassword('seven blue anvils at noon')).not.toBe(one)
    expect(await isPassword(one, 'seven blue anvils at noon')).toBe(true)
    expect(await isPassword(one, 'seven blue anvils at noon ')).toBe(false)
  })
  it('is worked through even where there is none', async () => {
    expect(await isPassword(null, 'seven blue anvils at noon')).toBe(false)
  })
  it('of other cost is known as outdated', async () => {
    expect(isOutdated(await hashPassword('seven blue anvils at noon'))).toBe(false)
    expect(isOutdated(await hash('seven blue anvils at noon', { memoryCost: 4096, timeCost: 1 }))).toBe(true)
  })
})
