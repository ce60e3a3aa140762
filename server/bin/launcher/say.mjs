const WIDTH = 46

// The reader of our output may go away (a closed pipe); the servers must not fall over because of it.
process.stdout.on('error', () => {})
process.stderr.on('error', () => {})

let openLine = false

/** One line of its own, also while a step is still open. */
export function say(text = '') {
  if (openLine) process.stdout.write('\n')
  openLine = false
  process.stdout.write(`${text}\n`)
}

/** One progress line: the title at once, then what came of it and the seconds it took. `work` returns the outcome as text. */
export async function step(title, work) {
  const began = performance.now()
  const lead = `${title} `.padEnd(WIDTH, '.')
  process.stdout.write(lead)
  openLine = true
  const finish = (outcome) => {
    const seconds = ((performance.now() - began) / 1000).toFixed(1)
    process.stdout.write(`${openLine ? '' : lead} ${outcome}  ${seconds} s\n`)
    openLine = false
  }
  try {
    finish(await work())
  } catch (error) {
    finish(error.name === 'Interrupted' ? 'stopped' : 'failed')
    throw error
  }
}
