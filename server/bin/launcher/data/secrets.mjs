import { randomBytes } from 'node:crypto'
import fs from 'node:fs'
import path from 'node:path'
import { dataFolder } from './project.mjs'
import { writeWhole } from './remembered.mjs'

/** 256 random bits in letters, digits, `-` and `_`: fit for URLs, SQL literals and configuration files as they are. */
export const randomSecret = () => randomBytes(32).toString('base64url')

/** The secret of this name, made on first use and kept in a file that only its owner may read. */
export function secret(name, folder = path.join(dataFolder, 'secrets')) {
  const file = path.join(folder, name)
  fs.mkdirSync(folder, { recursive: true, mode: 0o700 })
  if (!fs.existsSync(file)) writeWhole(file, `${randomSecret()}\n`)
  return fs.readFileSync(file, 'utf8').trim()
}
