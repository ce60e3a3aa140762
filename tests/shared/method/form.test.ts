import { describe, expect, it } from 'vitest'
import * as z from 'zod'
import { formFields } from '../../../shared/method/form.ts'
import { methods } from '../../../shared/methods.ts'
import { tools } from '../../../shared/tools.ts'

describe('entry form of a schema', () => {
  it('draws numbers with their unit, step and limits', () => {
    expect(formFields(z.strictObject({
      force: z.number().positive().max(3000).meta({ label: 'Force', unit: 'kgf', step: 0.1, help: 'nominal' }),
      count: z.int().min(1).optional().default(3),
    }))).toEqual([
      { name: 'force', label: 'Force', help: 'nominal', optional: false, kind: 'number', whole: false, exclusiveMinimum: 0, maximum: 3000, unit: 'kgf', step: 0.1 },
      { name: 'count', label: 'count', optional: true, initial: 3, kind: 'number', whole: true, minimum: 1 },
    ])
  })
  it('draws text, yes or no, and choices with their words', () => {
    expect(formFields(z.strictObject({
      note: z.string().max(80).optional().meta({ label: 'Note' }), dry: z.boolean().meta({ label: 'Dry' }),
      rule: z.enum(['a', 'b']).meta({ label: 'Rule', choices: { a: 'First' } }), fixed: z.literal('steel').meta({ label: 'Material' }),
    }))).toEqual([
      { name: 'note', label: 'Note', optional: true, kind: 'text', longest: 80 },
      { name: 'dry', label: 'Dry', optional: false, kind: 'boolean' },
      { name: 'rule', label: 'Rule', optional: false, kind: 'choice', options: [{ value: 'a', label: 'First' }, { value: 'b', label: 'b' }] },
      { name: 'fixed', label: 'Material', optional: false, kind: 'choice', options: [{ value: 'steel', label: 'Material' }] },
    ])
  })
  it('draws lists of numbers and of rows, and groups', () => {
    const [diameters, marks, curve] = formFields(z.strictObject({
      diametersMm: z.array(z.number().positive()).min(1).max(9).meta({ label: 'Diameters', unit: 'mm' }),
      marks: z.array(z.strictObject({ x: z.number() })).meta({ label: 'Marks' }),
      curve: z.strictObject({ forceN: z.array(z.number().meta({ unit: 'N' })) }).optional().meta({ label: 'Curve' }),
    }))
    expect(diameters).toEqual({ name: 'diametersMm', label: 'Diameters', optional: false, kind: 'numbers', whole: false, exclusiveMinimum: 0, unit: 'mm', fewest: 1, most: 9 })
    expect(marks).toMatchObject({ kind: 'table', label: 'Marks', columns: [{ name: 'x', kind: 'number' }], fewest: 0 })
    expect(curve).toMatchObject({ kind: 'group', optional: true, fields: [{ name: 'forceN', kind: 'numbers', unit: 'N' }] })
  })
  it('draws a discriminated union as a choice with the fields that depend on it', () => {
    const [surface] = formFields(z.strictObject({
      surface: z.discriminatedUnion('shape', [z.strictObject({ shape: z.literal('flat').meta({ label: 'Flat' }) }), z.strictObject({ shape: z.literal('cylinder'), diameterMm: z.number() })]).meta({ label: 'Surface' }),
    }))
    expect(surface).toMatchObject({
      kind: 'variants', key: 'shape', label: 'Surface',
      options: [{ value: 'flat', label: 'Flat', fields: [] }, { value: 'cylinder', label: 'cylinder', fields: [{ name: 'diameterMm', kind: 'number' }] }],
    })
  })
  it('draws the columns of a set', () => {
    expect(formFields(z.array(z.strictObject({ value: z.number() })).min(1)).map((field) => field.name)).toEqual(['value'])
  })
  it.each([['a bare number', z.number()], ['a list of texts', z.strictObject({ names: z.array(z.string()) })], ['anything', z.strictObject({ x: z.unknown() })], ['a union without a mark', z.strictObject({ x: z.union([z.number(), z.string()]) })]])('refuses %s', (_, schema) => {
    expect(() => formFields(schema)).toThrow(RangeError)
  })
  it.each(methods.map((method) => [method.id, method] as const))('draws all of %s, every field with its own words', (_, method) => {
    for (const schema of [method.parameters, method.readings]) {
      const fields = formFields(schema)
      expect(fields.length).toBeGreaterThan(0)
      for (const field of fields) expect(field.label).not.toBe(field.name)
    }
  })
  it('has tools and methods with names of their own', () => {
    const ids = [...methods, ...tools].map((one) => one.id)
    expect(new Set(ids).size).toBe(ids.length)
  })
})
