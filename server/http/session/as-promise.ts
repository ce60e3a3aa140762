/** Waits for something that calls back with an error or nothing, as sessions do. */
export function asPromise(work: (done: (error?: unknown) => void) => void): Promise<void> {
  return new Promise((resolve, reject) => work((error) => {
    if (error == null) resolve()
    else reject(error instanceof Error ? error : new Error('the session could not be kept', { cause: error }))
  }))
}
