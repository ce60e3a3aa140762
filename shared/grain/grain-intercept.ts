import { defineMethod } from '../method/define-method.ts'
import type { ResultName, StepNeed } from '../method/method.ts'
import { fieldConfidence } from './field-confidence.ts'
import { grainCautions } from './grain-cautions.ts'
import { grainInterceptChecks } from './grain-intercept-checks.ts'
import { GrainInterceptParameters, GrainInterceptReadings } from './grain-intercept-input.ts'
import { grainInterceptResults } from './grain-intercept-results.ts'
import { grainRules, grainStandards } from './grain-size-number.ts'

export const grainIntercept = defineMethod({
  id: 'grain-intercept',
  version: 1,
  title: 'Grain size by intercept',
  standards: grainStandards,
  parameters: GrainInterceptParameters,
  readings: GrainInterceptReadings,
  measured: [],
  resultNames: [
    { key: 'interceptsPerMm', symbol: 'N_L', name: 'Intercepts per mm', unit: '1/mm', decimals: 1 },
    { key: 'meanIntercept', symbol: 'l', name: 'Mean intercept', unit: 'mm', decimals: 4 },
    { key: 'grainSize', symbol: 'G', name: 'Grain size number', unit: '', decimals: 1 },
    { key: 'confidence95', symbol: 'CI', name: '95 % confidence, half-width on G', unit: '', decimals: 2 },
    { key: 'relativeAccuracy', symbol: '%RA', name: 'Relative accuracy', unit: '%', decimals: 1 },
  ] satisfies ResultName[],
  mainResult: 'grainSize',
  suggest: () => ({ standard: 'ASTM E112' }),
  label: () => 'Grain size, intercept',
  summary: ({ standard }) => `${grainRules[standard].edition}, 3 fields or more and 50 counts in all`,
  needs: () => steps,
  misfits: (_, piece) => {
    const smallest = Math.min(piece.thicknessMm ?? Infinity, piece.diameterMm ?? Infinity, piece.widthMm ?? Infinity)
    return smallest >= SMALLEST_SECTION ? [] : [{
      message: `a section ${smallest} mm across is too small for three separate fields: ${SMALLEST_SECTION} mm or more are needed`, cures: [],
    }]
  },
  cautions: () => [...grainCautions],
  evaluate: ({ parameters: { standard }, readings, uncertainty }) => {
    const counts = readings.map((field) => field.intersections ?? field.intercepts ?? 0)
    const lengthsMm = readings.map((field) => field.lineLengthMm)
    const what = readings[0]?.intercepts === undefined ? 'intersections' : 'intercepts'
    const confidence = fieldConfidence(counts.map((count, i) => count / (lengthsMm[i] ?? NaN)))
    return {
      results: grainInterceptResults({ lengthsMm, counts, what }, standard, confidence, uncertainty),
      checks: grainInterceptChecks(counts, confidence),
    }
  },
  report: ({ parameters: { standard }, readings }) => [
    `Grain size by the intercept method of ${grainRules[standard].edition}, on a prepared and etched section.`,
    `${readings.length} field${readings.length === 1 ? '' : 's'}, ${readings[0]?.intercepts === undefined ? 'boundary intersections' : 'intercepted grains'} counted and pooled; the confidence rests on the scatter between fields.`,
  ],
})

/** Side in mm below which three fields at 100 × would overlap or run over the edge. */
const SMALLEST_SECTION = 0.5

const steps: StepNeed[] = [
  { kind: 'section', capability: 'section', setupMinutes: 10, runMinutes: 10, attended: 'all', needs: {} },
  { kind: 'mount', capability: 'mount', setupMinutes: 5, runMinutes: 12, attended: 'setup', needs: {} },
  { kind: 'grind and polish', capability: 'grind and polish', setupMinutes: 5, runMinutes: 25, attended: 'setup', needs: {} },
  { kind: 'etch', capability: 'etch', setupMinutes: 5, runMinutes: 5, attended: 'setup', needs: {} },
  { kind: 'measure', detail: 'grain size', capability: 'grain-intercept', setupMinutes: 5, runMinutes: 20, attended: 'all', needs: {} },
]
