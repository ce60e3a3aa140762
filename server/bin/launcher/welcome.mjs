import { Failure } from './failure.mjs'
import { lastLines } from './processes/run.mjs'

/** The accounts of the demonstration: the last line that the seed writes is `{"accounts":[{email,password,what}]}`. */
export function readAccounts(output) {
  try {
    const { accounts } = JSON.parse(lastLines(output, 1))
    return accounts.map(({ email, password, what }) => ({ email, password, what }))
  } catch {
    throw new Failure(`The demonstration data did not end with a list of accounts, but with:\n${lastLines(output)}`)
  }
}

/** Where everything is, and who may sign in, in columns. */
export function welcome({ address, mailPage, accounts }) {
  const width = (name) => Math.max(...accounts.map((account) => account[name].length)) + 2
  const rows = accounts.map(({ email, password, what }) => `  ${email.padEnd(width('email'))}${password.padEnd(width('password'))}${what}`)
  return [
    '',
    `Crosshead is ready:  ${address}`,
    ...(mailPage ? [`Mail it has sent:    ${mailPage}`] : []),
    'Log files:           .data/log',
    ...(rows.length > 0 ? ['', 'Sign in with one of the demonstration accounts:', ...rows] : []),
    '',
    'Ctrl-C stops everything.',
  ].join('\n')
}
