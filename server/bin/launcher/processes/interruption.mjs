import { Interrupted } from '../failure.mjs'

const controller = new AbortController()

/** Aborted once, when the person asks to stop. */
export const interruption = controller.signal

/**
 * Ctrl-C, `kill` and a closed terminal all mean: stop in order. npm passes Ctrl-C on a second time
 * after the terminal has sent it, so every later signal is taken and ignored.
 */
export function listenForInterruption() {
  for (const signal of ['SIGINT', 'SIGTERM', 'SIGHUP']) process.on(signal, () => controller.abort(new Interrupted(signal)))
}

export const untilInterrupted = () =>
  new Promise((resolve) => {
    if (interruption.aborted) resolve()
    else interruption.addEventListener('abort', () => resolve(), { once: true })
  })

/** Waits, but not beyond an interruption. */
export function pause(milliseconds) {
  return new Promise((resolve) => {
    const done = () => {
      clearTimeout(timer)
      interruption.removeEventListener('abort', done)
      resolve()
    }
    const timer = setTimeout(done, milliseconds)
    interruption.addEventListener('abort', done)
  })
}
