/** Something a person can act on: shown as it is, without a stack. */
export class Failure extends Error {}

/** Thrown out of a step when the person asked to stop. */
export class Interrupted extends Error {
  name = 'Interrupted'
}

/** Text for people: our own failures as they are, access errors with a way out, anything else with its stack. */
export function explain(error) {
  if (error instanceof Failure) return error.message
  if (error.code === 'EACCES' || error.code === 'EPERM') {
    return `No right to use ${error.path ?? 'a file'}: it belongs to another account.\n` +
      'Start as that account, or remove .data to begin with an empty demonstration.'
  }
  return error.stack ?? String(error)
}
