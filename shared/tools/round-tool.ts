import * as z from 'zod'
import { defineTool } from '../method/define-tool.ts'
import { round, roundingRules } from '../units/round.ts'

const decimal = (label: string) => z.string().max(200).regex(/^[+-]?\d+(\.\d+)?$/, 'must be a plain decimal number').meta({ label })

/** Rounding exact in decimal, as the standards round. */
export const roundTool = defineTool({
  id: 'round',
  title: 'Round',
  input: z.strictObject({
    value: decimal('Value'),
    increment: decimal('Increment').refine((text) => !text.startsWith('-') && /[1-9]/.test(text), 'must be above 0'),
    rule: z.enum(roundingRules).meta({ label: 'Rule', choices: { 'half-even': 'Half to even', 'half-up': 'Half away from zero' } }),
  }),
  run: ({ value, increment, rule }) => ({ rounded: round(value, increment, rule) }),
})
