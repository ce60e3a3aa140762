import * as z from 'zod'
import { splitPath } from './entries.ts'
import type { Method } from './method.ts'

/** Row numbers of a set stay below this. */
const mostRows = 10_000

/**
 * What is wrong with one thing that is to be kept at the bench, in words; null when it can be kept. Rules between
 * readings are the method's own and are told by its checks.
 */
export function checkEntry(method: Method, path: string, value: unknown): string | null {
  let side: 'parameters' | 'readings', key: string
  try {
    [side, key] = splitPath(path)
  } catch {
    return 'is not a place for a reading'
  }
  const schema = schemaAt(method, side, key)
  if (typeof schema === 'string') return schema
  const parsed = schema.safeParse(value)
  return parsed.success ? null : parsed.error.issues.map((issue) => [issue.path.join('.'), issue.message].filter(Boolean).join(': ')).join('; ')
}

function schemaAt(method: Method, side: 'parameters' | 'readings', key: string): z.ZodType | string {
  if (side === 'parameters') {
    if (!method.measured.includes(key)) return 'is ordered by the customer and cannot be changed at the bench'
    return partOf(method.parameters, key) ?? 'is not known here'
  }
  const { readings } = method
  if (!method.isSet) return partOf(readings, key) ?? 'is not known here'
  if (!/^(0|[1-9]\d{0,4})$/.test(key) || Number(key) >= mostRows) return `rows are numbered from 0 to ${mostRows - 1}`
  return readings instanceof z.ZodArray ? (readings.element as z.ZodType) : 'is not known here'
}

function partOf(schema: z.ZodType, key: string): z.ZodType | undefined {
  // only the schema's own keys: every object answers to names like "constructor"
  return schema instanceof z.ZodObject && Object.hasOwn(schema.shape, key) ? (schema.shape as Record<string, z.ZodType | undefined>)[key] : undefined
}
