import * as z from 'zod'
import type { Evaluation, Method } from './method/method.ts'
import type { Tool } from './method/define-tool.ts'
import { Requirement } from './method/requirement.ts'
import { Uncertainty } from './method/uncertainty.ts'
import { verdict } from './method/verdict.ts'
import { methodOf } from './methods.ts'
import { tools } from './tools.ts'

export type Issue = { path: (string | number)[]; message: string }
export type Failure = { code: 'invalid-input' | 'outside-range' | 'unknown-method' | 'unknown-tool'; issues: Issue[] }
export type Refused = { method?: string; tool?: string; error: Failure }
export type ToolAnswer = { tool: string } & Record<string, unknown>
export type Answer = Evaluation | ToolAnswer | Refused

/** More faults than these are the same fault again: a list of a million texts is told once. */
const MOST_ISSUES = 50

/**
 * One case of the calculation contract: `{ method, parameters, readings, requirement?, uncertainty? }` or `{ tool, … }`. Never
 * throws for what it is given: what cannot be answered comes back as `error` with its code.
 */
export function evaluate(one: unknown): Answer {
  if (typeof one !== 'object' || one === null || Array.isArray(one)) return { error: invalid([{ path: [], message: 'a case must be an object' }]) }
  const { method: methodId, tool: toolId, ...rest } = one as Record<string, unknown>
  if (methodId !== undefined && toolId !== undefined) return { error: invalid([{ path: ['tool'], message: 'a case names a method or a tool, not both' }]) }
  if (typeof methodId === 'string') {
    const method = methodOf(methodId)
    if (!method) return { method: methodId, error: { code: 'unknown-method', issues: [{ path: ['method'], message: `there is no method ${quoted(methodId)}` }] } }
    return evaluateMethod(method, rest)
  }
  if (typeof toolId === 'string') {
    const tool = tools.find((each) => each.id === toolId)
    if (!tool) return { tool: toolId, error: { code: 'unknown-tool', issues: [{ path: ['tool'], message: `there is no tool ${quoted(toolId)}` }] } }
    return runTool(tool, rest)
  }
  return { error: invalid([{ path: [methodId === undefined && toolId !== undefined ? 'tool' : 'method'], message: 'must be the name of a method or a tool' }]) }
}

/** Whether an answer is an error. */
export function isRefused(answer: Answer): answer is Refused {
  return 'error' in answer
}

const Rest = z.strictObject({ parameters: z.unknown(), readings: z.unknown(), requirement: Requirement.optional(), uncertainty: Uncertainty.optional() })

function evaluateMethod(method: Method, rest: Record<string, unknown>): Evaluation | Refused {
  const around = Rest.safeParse(rest)
  const issues = around.success ? [] : issuesOf(around.error)
  if (around.success) issues.push(...unknownKeys(method, around.data.requirement))
  try {
    const { results, checks } = method.evaluate({ parameters: rest.parameters, readings: rest.readings, uncertainty: around.data?.uncertainty })
    const requirement = around.data?.requirement
    if (issues.length > 0) return { method: method.id, error: invalid(issues) }
    return { method: method.id, results, checks, ...(requirement && { verdict: verdict(requirement, results) }) }
  } catch (error) {
    return { method: method.id, error: failureOf(error, issues) }
  }
}

function runTool(tool: Tool, input: Record<string, unknown>): ToolAnswer | Refused {
  try {
    return { tool: tool.id, ...tool.run(input) }
  } catch (error) {
    return { tool: tool.id, error: failureOf(error, []) }
  }
}

/** A limit on something that the method never reports is a slip of the pen, not an undecided limit. */
function unknownKeys(method: Method, requirement: Requirement | undefined): Issue[] {
  const known = method.resultNames.map((name) => name.key)
  return (requirement?.limits ?? []).flatMap(({ key }, i) => known.includes(key) ? [] : [{ path: ['requirement', 'limits', i, 'key'], message: `must be one of ${known.join(', ')}` }])
}

function failureOf(error: unknown, before: Issue[]): Failure {
  if (error instanceof z.ZodError) return invalid([...before, ...issuesOf(error)])
  if (before.length > 0) return invalid(before)
  if (error instanceof RangeError) return { code: 'outside-range', issues: [{ path: [], message: error.message }] }
  throw error
}

function invalid(issues: Issue[]): Failure {
  return { code: 'invalid-input', issues: issues.slice(0, MOST_ISSUES) }
}

/** zod's findings with a path to the very key, also where it is the key that should not be there. */
function issuesOf(error: z.ZodError): Issue[] {
  return error.issues.slice(0, MOST_ISSUES).flatMap((issue): Issue[] => {
    const path = issue.path.map((step) => (typeof step === 'number' ? step : String(step)))
    return issue.code === 'unrecognized_keys' ? issue.keys.slice(0, MOST_ISSUES).map((key) => ({ path: [...path, key], message: 'is not known here' })) : [{ path, message: issue.message }]
  })
}

function quoted(text: string): string {
  return JSON.stringify(text.length > 60 ? `${text.slice(0, 60)}…` : text)
}
