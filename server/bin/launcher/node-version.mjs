import { Failure } from './failure.mjs'

const NEEDED = [20, 19]

/** Debian 12's own Node.js is 18, so this is the first thing many people meet. */
export function checkNodeVersion(version = process.versions.node) {
  const [major, minor] = version.split('.').map(Number)
  if (major < NEEDED[0] || (major === NEEDED[0] && minor < NEEDED[1])) {
    throw new Failure(`Node.js ${NEEDED.join('.')} or newer is needed; this is ${version} (${process.execPath}). See https://nodejs.org/en/download.`)
  }
  return version
}
