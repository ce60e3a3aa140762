import { v7 } from 'uuid'
import * as z from 'zod'

type Node = {
  type?: string; format?: string; const?: unknown; enum?: unknown[]; anyOf?: Node[]; oneOf?: Node[]; allOf?: Node[]; $ref?: string; default?: unknown; pattern?: string
  minLength?: number; minimum?: number; exclusiveMinimum?: number; minItems?: number; items?: Node; properties?: Record<string, Node>; required?: string[]
}

/** The plainest value that a schema takes: what may be left out is, texts are as short as they may be, and every id is new. */
export function exampleOf(schema: z.ZodType): unknown {
  return valueOf(z.toJSONSchema(schema, { io: 'input', unrepresentable: 'any' }) as Node)
}

function valueOf(node: Node): unknown {
  if (node.const !== undefined) return node.const
  if (node.enum) return node.enum[0]
  const choices = node.anyOf ?? node.oneOf
  if (choices) return choices.some(({ type }) => type === 'null') ? null : valueOf(choices[0]!)
  switch (node.type) {
    case 'string': return textOf(node)
    case 'integer': case 'number': return node.minimum ?? (node.exclusiveMinimum ?? 0) + 1
    case 'boolean': return false
    case 'array': return Array.from({ length: node.minItems ?? 0 }, () => valueOf(node.items ?? {}))
    case 'object': return Object.fromEntries((node.required ?? []).map((key) => [key, valueOf(node.properties?.[key] ?? {})]))
    case undefined: default: return null
  }
}

function textOf({ format, minLength = 0, pattern }: Node): string {
  if (format === 'uuid') return v7()
  if (format === 'email') return `nobody.${v7()}@people.example`
  if (format === 'date') return '2030-01-31'
  if (format === 'date-time') return '2030-01-31T12:00:00Z'
  const text = 'x'.repeat(Math.max(minLength, 1))
  return pattern && !new RegExp(pattern).test(text) ? 'x'.repeat(24) : text
}
