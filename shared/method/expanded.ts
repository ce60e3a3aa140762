import { combineUncertainty, type BudgetLine } from '../statistics/combine-uncertainty.ts'
import { significant } from '../units/significant.ts'
import type { DerivationStep, UncertaintyComponent } from './method.ts'

export type Expanded = { expandedUncertainty: number; coverageFactor: number; step: DerivationStep }

/**
 * Expanded uncertainty of a main result: the components given, with the spread of the readings (standard uncertainty of their mean
 * and its degrees of freedom) added, at 95.45 % coverage (JCGM 100:2008, Annex G). `spread` is missing for a single reading.
 * Undefined when no components were given: the spread alone is no statement of uncertainty.
 */
export function expanded(given: { components: UncertaintyComponent[] } | undefined, spread: BudgetLine | undefined, unit: string): Expanded | undefined {
  if (!given) return undefined
  const lines = [...given.components, ...(spread ? [{ name: 'spread of the readings', ...spread }] : [])]
  const { combined, effectiveDegreesOfFreedom, coverageFactor, expanded: value } = combineUncertainty(lines)
  const share = ({ name, standardUncertainty, sensitivity = 1 }: UncertaintyComponent) => `${name} ${short(standardUncertainty * sensitivity)}`
  const freedom = effectiveDegreesOfFreedom === null ? 'infinite' : short(effectiveDegreesOfFreedom)
  return {
    expandedUncertainty: value,
    coverageFactor,
    step: {
      text: `expanded uncertainty of ${lines.slice(0, 20).map(share).join(', ')}${lines.length > 20 ? ', …' : ''}`,
      formula: `U = k × u = ${short(coverageFactor)} × ${short(combined)} (effective degrees of freedom ${freedom}, coverage 95.45 %)`,
      clause: 'JCGM 100:2008, G.4',
      value,
      unit,
    },
  }
}

function short(value: number): string {
  return significant(value, 4)
}
