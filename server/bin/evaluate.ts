import { buffer } from 'node:stream/consumers'
import { evaluateText } from '../../shared/evaluate-text.ts'

/** `npm run --silent evaluate < case.json`: a case or an array of cases in, the same shape out; status 1 if any has an error. */
const { output, failed } = evaluateText((await buffer(process.stdin)).toString('utf8'))
process.stdout.write(`${JSON.stringify(output, null, 2)}\n`)
process.exitCode = failed ? 1 : 0
