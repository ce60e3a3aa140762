import { planInput, type PlanError } from '../../shared/routing/plan-input.ts'
import type { Plan } from '../../shared/routing/plan.ts'

/** Reads one shop, or an array of shops, from standard input and prints one plan, or an array of plans in the same order. */
const chunks: Buffer[] = []
for await (const chunk of process.stdin) chunks.push(Buffer.from(chunk as Uint8Array))
const answer = answerTo(Buffer.concat(chunks).toString('utf8'))
process.stdout.write(`${JSON.stringify(answer)}\n`)
process.exitCode = (Array.isArray(answer) ? answer : [answer]).some((each) => 'error' in each) ? 1 : 0

function answerTo(text: string): Plan | PlanError | (Plan | PlanError)[] {
  let input: unknown
  try {
    input = JSON.parse(text)
  } catch (error) {
    const why = error instanceof Error ? error.message : String(error)
    return { error: { code: 'invalid-input', issues: [{ path: [], message: `the input is not JSON: ${why}` }] } }
  }
  return Array.isArray(input) ? input.map((shop: unknown) => planInput(shop)) : planInput(input)
}
