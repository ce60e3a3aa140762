import * as z from 'zod'
import type { Field, NumberLimits } from './field.ts'

/** What of a JSON schema a form draws. Labels, units and steps are put there by `.meta` of the schema. */
const Node: z.ZodType<Node> = z.lazy(() => z.object({
  type: z.string().optional(),
  label: z.string().optional(),
  help: z.string().optional(),
  unit: z.string().optional(),
  step: z.number().optional(),
  choices: z.record(z.string(), z.string()).optional(),
  default: z.unknown().optional(),
  enum: z.array(z.union([z.string(), z.number()])).optional(),
  const: z.unknown().optional(),
  minimum: z.number().optional(), exclusiveMinimum: z.number().optional(), maximum: z.number().optional(), exclusiveMaximum: z.number().optional(),
  maxLength: z.number().optional(), minItems: z.number().optional(), maxItems: z.number().optional(),
  properties: z.record(z.string(), Node).optional(),
  required: z.array(z.string()).optional(),
  items: Node.optional(),
  oneOf: z.array(Node).optional(),
}))
type Node = {
  type?: string; label?: string; help?: string; unit?: string; step?: number; choices?: Record<string, string>; default?: unknown; enum?: (string | number)[]; const?: unknown
  minimum?: number; exclusiveMinimum?: number; maximum?: number; exclusiveMaximum?: number; maxLength?: number; minItems?: number; maxItems?: number
  properties?: Record<string, Node>; required?: string[]; items?: Node; oneOf?: Node[]
}

/**
 * The entry form of a schema: a field for each property of an object; of a list of objects, a field for each column of
 * its rows. A property without a type but with a unit is a column of a record, whose schema checks millions of points by itself. Throws RangeError for a schema that no form can draw, so that a method with one is found by its test.
 */
export function formFields(schema: z.ZodType): Field[] {
  const parsed = Node.safeParse(z.toJSONSchema(schema, { io: 'input', unrepresentable: 'any' }))
  if (!parsed.success) throw new RangeError(`no form can be drawn: ${z.prettifyError(parsed.error)}`)
  const node = parsed.data
  return fieldsOf(node.type === 'array' && node.items ? node.items : node, 'the form')
}

function fieldsOf(node: Node, where: string): Field[] {
  if (!node.properties) throw new RangeError(`${where} is drawn from an object or a list of objects`)
  return Object.entries(node.properties).map(([name, property]) => field(name, property, !(node.required ?? []).includes(name)))
}

function field(name: string, node: Node, optional: boolean): Field {
  const base = { name, label: node.label ?? name, optional, ...(node.help && { help: node.help }), ...(node.default !== undefined && { initial: node.default }) }
  if (node.oneOf) return { ...base, kind: 'variants', ...variants(name, node.oneOf) }
  if (node.enum) return { ...base, kind: 'choice', options: node.enum.map((value) => ({ value, label: node.choices?.[value] ?? String(value) })) }
  if (node.type === undefined && node.unit !== undefined) return { ...base, kind: 'numbers', ...limits(node), fewest: 0 }
  if (typeof node.const === 'string' || typeof node.const === 'number') return { ...base, kind: 'choice', options: [{ value: node.const, label: node.label ?? String(node.const) }] }
  switch (node.type) {
    case 'number': case 'integer': return { ...base, kind: 'number', ...limits(node) }
    case 'string': return { ...base, kind: 'text', ...(node.maxLength !== undefined && { longest: node.maxLength }) }
    case 'boolean': return { ...base, kind: 'boolean' }
    case 'object': return { ...base, kind: 'group', fields: fieldsOf(node, name) }
    case 'array': return list(base, node)
    case undefined: default: throw new RangeError(`no form field can be drawn for ${name}`)
  }
}

function list(base: { name: string; label: string; optional: boolean }, node: Node): Field {
  const items = node.items ?? {}
  const size = { fewest: node.minItems ?? 0, ...(node.maxItems !== undefined && { most: node.maxItems }) }
  if (items.type !== 'number' && items.type !== 'integer') return { ...base, kind: 'table', columns: fieldsOf(items, base.name), ...size }
  return { ...base, kind: 'numbers', ...limits({ ...items, unit: node.unit ?? items.unit, step: node.step ?? items.step }), ...size }
}

/** The property that is fixed in every option tells them apart. */
function variants(name: string, options: Node[]) {
  const key = Object.keys(options[0]?.properties ?? {}).find((property) => options.every((option) => typeof option.properties?.[property]?.const === 'string'))
  if (key === undefined) throw new RangeError(`the options of ${name} need a property that tells them apart`)
  return {
    key,
    options: options.map((option) => {
      const mark = option.properties?.[key]
      const value = String(mark?.const)
      return { value, label: option.label ?? mark?.label ?? value, fields: fieldsOf(option, name).filter((one) => one.name !== key) }
    }),
  }
}

/** Bounds that zod adds for a safe integer are no limits of the subject. */
function limits(node: Node): NumberLimits {
  const { minimum, exclusiveMinimum, maximum, exclusiveMaximum, step, unit, type } = node
  return {
    whole: type === 'integer',
    ...(minimum !== undefined && minimum > Number.MIN_SAFE_INTEGER && { minimum }), ...(exclusiveMinimum !== undefined && { exclusiveMinimum }),
    ...(maximum !== undefined && maximum < Number.MAX_SAFE_INTEGER && { maximum }), ...(exclusiveMaximum !== undefined && { exclusiveMaximum }),
    ...(step !== undefined && { step }), ...(unit !== undefined && { unit }),
  }
}
