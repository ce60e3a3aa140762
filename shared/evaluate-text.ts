import { evaluate, isRefused, type Answer } from './evaluate.ts'

/**
 * JSON text in, answers out, as the command line and the API give them: an array for an array, in order; one answer for anything else. `failed` when
 * any case has an error, or the text is no JSON.
 */
export function evaluateText(text: string): { output: Answer | Answer[]; failed: boolean } {
  let input: unknown
  try {
    input = JSON.parse(text.replace(/^\uFEFF/, ''))
  } catch {
    return { output: { error: { code: 'invalid-input', issues: [{ path: [], message: 'the text is no JSON' }] } }, failed: true }
  }
  if (!Array.isArray(input)) {
    const output = evaluate(input)
    return { output, failed: isRefused(output) }
  }
  const output = input.map(evaluate)
  return { output, failed: output.some(isRefused) }
}
