import { round } from '../units/round.ts'
import type { TensileParameters } from './tensile-parameters.ts'

/** What is rounded: each kind has its own interval in a standard. */
export type Quantity = 'area' | 'slope' | 'stress' | 'yieldExtension' | 'elongationByHand' | 'elongationByExtensometer' | 'reduction' | 'ratio'

type Rule = { increment: string; unit: string; clause: string }

const lab = 'lab rule'
const iso = 'ISO 6892-1:2019, clause 22'
const astm = 'ASTM E8/E8M, 7.14 procedure 2'

const common = {
  area: { increment: '0.01', unit: 'mm²', clause: lab },
  slope: { increment: '100', unit: 'MPa', clause: lab },
  ratio: { increment: '0.001', unit: '', clause: lab },
} as const

/** Rounding intervals by standard, half to even (ISO 80000-1 rule A, ASTM E29). */
const rules: Record<TensileParameters['standard'], Record<Quantity, Rule>> = {
  'ISO 6892-1': {
    ...common,
    stress: { increment: '1', unit: 'MPa', clause: iso },
    yieldExtension: { increment: '0.1', unit: '%', clause: iso },
    elongationByHand: { increment: '0.5', unit: '%', clause: iso },
    elongationByExtensometer: { increment: '0.5', unit: '%', clause: iso },
    reduction: { increment: '1', unit: '%', clause: iso },
  },
  'ASTM E8/E8M': {
    ...common,
    stress: { increment: '1', unit: 'MPa', clause: astm },
    yieldExtension: { increment: '0.1', unit: '%', clause: astm },
    elongationByHand: { increment: '0.5', unit: '%', clause: astm },
    elongationByExtensometer: { increment: '0.1', unit: '%', clause: astm },
    reduction: { increment: '0.5', unit: '%', clause: astm },
  },
}

/** A value as the standard reports it, with the step that says so. */
export function reportedAs(value: number, quantity: Quantity, standard: TensileParameters['standard']) {
  const { increment, unit, clause } = rules[standard][quantity]
  const reported = [round(value, increment), unit].filter(Boolean).join(' ')
  return { reported, step: { text: `rounded to ${increment}${unit && ` ${unit}`}, half to even`, clause, reported } }
}
