import fs from 'node:fs'
import path from 'node:path'
import { inData } from './project.mjs'

const fileOf = (name) => inData('remembered', `${name}.json`)

/** Writes a file whole or not at all, so that a kill in the middle leaves the old one. */
export function writeWhole(file, content, mode = 0o600) {
  fs.mkdirSync(path.dirname(file), { recursive: true })
  const draft = `${file}.${process.pid}`
  fs.writeFileSync(draft, content, { mode })
  fs.renameSync(draft, file)
}

/** What an earlier start noted under this name; undefined when there is nothing readable. */
export function recall(name) {
  try {
    return JSON.parse(fs.readFileSync(fileOf(name), 'utf8'))
  } catch (error) {
    if (error.code === 'ENOENT' || error instanceof SyntaxError) return undefined
    throw error
  }
}

export const remember = (name, value) => writeWhole(fileOf(name), `${JSON.stringify(value)}\n`)
export const forget = (name) => fs.rmSync(fileOf(name), { force: true })
