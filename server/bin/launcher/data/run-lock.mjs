import fs from 'node:fs'
import { identify, isSame } from '../processes/processes.mjs'
import { dataFolder, inData } from './project.mjs'
import { writeWhole } from './remembered.mjs'

const file = inData('running.json')

function holder() {
  try {
    return JSON.parse(fs.readFileSync(file, 'utf8'))
  } catch (error) {
    if (error.code === 'ENOENT' || error instanceof SyntaxError) return null
    throw error
  }
}

/** Takes the right to run here; returns the launcher that has it already, or null when it is ours. */
export function takeLock() {
  fs.mkdirSync(dataFolder, { recursive: true })
  for (;;) {
    const draft = `${file}.${process.pid}`
    fs.writeFileSync(draft, JSON.stringify(identify(process.pid, 'start.mjs')), { mode: 0o600 })
    try {
      fs.linkSync(draft, file) // appears whole, and only if nobody else has it
      return null
    } catch (error) {
      if (error.code !== 'EEXIST') throw error
      const other = holder()
      if (isSame(other)) return other
      // Left by a killed launcher. Two that find it at once: only one moves this very file away.
      const stale = `${file}.stale-${process.pid}`
      if (JSON.stringify(holder()) === JSON.stringify(other)) {
        fs.renameSync(file, stale)
        fs.rmSync(stale, { force: true })
      }
    } finally {
      fs.rmSync(draft, { force: true })
    }
  }
}

/** Lets a second start say where we are. */
export const announce = (address) => writeWhole(file, JSON.stringify({ ...identify(process.pid, 'start.mjs'), address }))

export function releaseLock() {
  if (holder()?.pid === process.pid) fs.rmSync(file, { force: true })
}
