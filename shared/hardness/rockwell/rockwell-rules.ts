import type { DerivationStep } from '../../method/method.ts'
import { rockwellScale, type RockwellScale } from './rockwell-scale.ts'

export const rockwellStandards = ['ASTM E18', 'ISO 6508-1'] as const
export type RockwellStandard = (typeof rockwellStandards)[number]

type Rules = { edition: string; increment: string; rounding: DerivationStep; coneDepths: number; ballDepths: number }

/** Where the two standards differ. Factors of thickness and increments from memory of the editions named. */
export const rockwellRules: Record<RockwellStandard, Rules> = {
  'ASTM E18': {
    edition: 'ASTM E18-22', increment: '0.1', coneDepths: 10, ballDepths: 10,
    rounding: { text: 'rounded to 0.1 HR, half to even', clause: 'ASTM E18-22 with ASTM E29' },
  },
  'ISO 6508-1': {
    edition: 'ISO 6508-1:2016', increment: '0.5', coneDepths: 10, ballDepths: 15,
    rounding: { text: 'rounded to 0.5 HR, half to even', clause: 'ISO 6508-1:2016 with ISO 80000-1, Annex B, rule A' },
  },
}

/** Least distances in diameters of the print, alike in both standards. */
export const rockwellSpacing = { centres: 3, edge: 2.5 }

/** How many permanent depths the piece must be thick: 10, but 15 for a ball under ISO. */
export function depthsOfThickness(standard: RockwellStandard, scale: RockwellScale): number {
  const { coneDepths, ballDepths } = rockwellRules[standard]
  return rockwellScale[scale].indenter === 'cone' ? coneDepths : ballDepths
}

/** Corrections for cylinders above these are too large for ISO 6508-1, which prints none (from memory). */
export function greatestCorrection(scale: RockwellScale): number {
  return rockwellScale[scale].indenter === 'cone' ? 3 : 5
}
