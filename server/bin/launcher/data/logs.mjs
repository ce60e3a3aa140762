import fs from 'node:fs'
import { inData } from './project.mjs'
import { lastLines } from '../processes/run.mjs'

const LARGEST_BYTES = 20_000_000

export const logFile = (name) => inData('log', `${name}.log`)

/** The file for a new start; the one of the start before is kept as NAME.log.1, older ones are not. */
export function freshLog(name) {
  const file = logFile(name)
  fs.mkdirSync(inData('log'), { recursive: true, mode: 0o700 })
  if (fs.existsSync(file)) fs.renameSync(file, `${file}.1`)
  fs.writeFileSync(file, '', { mode: 0o600 })
  return file
}

/** Opened for appending only, so that shortening it under a running process is safe. */
export const openLog = (file) => fs.openSync(file, 'a', 0o600)

export const endOfLog = (file, count = 20) => (fs.existsSync(file) ? lastLines(fs.readFileSync(file, 'utf8'), count) : '')

/** Keeps the logs of a long run bounded: what has grown too large becomes NAME.log.1 and starts empty. */
export function boundLogs(names, largestBytes = LARGEST_BYTES) {
  for (const file of names.map(logFile)) {
    if (!fs.existsSync(file) || fs.statSync(file).size < largestBytes) continue
    fs.copyFileSync(file, `${file}.1`)
    fs.truncateSync(file)
  }
}
