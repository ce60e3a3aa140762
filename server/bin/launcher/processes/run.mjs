import fs from 'node:fs'
import { Failure } from '../failure.mjs'
import { interruption } from './interruption.mjs'
import { signal, spawnGuarded } from './processes.mjs'

export const lastLines = (text, count = 20) => text.trimEnd().split('\n').slice(-count).join('\n')

/**
 * Runs a command to its end and returns what it wrote. `log` also keeps it in a file, `input` goes to its stdin, `show` lets
 * it write to our own output. Throws a Failure with its last lines when it fails, and ends it when we are interrupted.
 */
export async function run(file, args, { log, input, show = false, mayFail = false, ...options } = {}) {
  interruption.throwIfAborted()
  const child = spawnGuarded(file, args, { deathSignal: 'SIGKILL', stdio: ['pipe', show ? 'inherit' : 'pipe', show ? 'inherit' : 'pipe'], ...options })
  const output = { stdout: '', stderr: '' }
  for (const name of ['stdout', 'stderr']) {
    child[name]?.setEncoding('utf8').on('data', (text) => {
      output[name] += text
      if (log) fs.appendFileSync(log, text)
    })
  }
  child.stdin.on('error', () => {}) // a command that ends without reading its input
  child.stdin.end(input)

  const end = () => signal(-child.pid, 'SIGTERM')
  interruption.addEventListener('abort', end)
  const status = await new Promise((resolve, reject) => {
    child.on('error', (error) => reject(new Failure(`${file} cannot be started: ${error.message}`)))
    child.on('close', (code, signalName) => resolve(code ?? signalName))
  }).finally(() => interruption.removeEventListener('abort', end))

  interruption.throwIfAborted()
  if (status !== 0 && !mayFail) {
    throw new Failure(`${[file, ...args].join(' ')} failed (${status})${log ? `, see ${log}` : ''}:\n${lastLines(output.stdout + output.stderr)}`)
  }
  return { status, ...output }
}
