import type * as z from 'zod'
import { evaluate } from '../../../shared/evaluate.ts'
import { Problem } from '../../../shared/problems.ts'

const mostCases = 500
type Json = z.infer<ReturnType<typeof z.json>>

/** Works out one case, or each of an array; what cannot be answered says so in its place. Nothing is kept. */
export function evaluateCase(input: Json): Json {
  if (!Array.isArray(input)) return asJson(evaluate(input))
  if (input.length > mostCases) throw new Problem('too-large', `${input.length} cases are more than ${mostCases} at once`)
  return input.map((one) => asJson(evaluate(one)))
}

/** An answer holds optional fields, which JSON leaves out. */
function asJson(answer: unknown): Json {
  return JSON.parse(JSON.stringify(answer)) as Json
}
