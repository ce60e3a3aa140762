import { defineMethod } from '../method/define-method.ts'
import { expanded } from '../method/expanded.ts'
import { listed } from '../method/listed.ts'
import type { DerivationStep } from '../method/method.ts'
import type { Piece } from '../method/piece.ts'
import { standardDeviation } from '../statistics/standard-deviation.ts'
import { cylinderCorrection } from './rockwell/cylinder-correction.ts'
import { hardnessResultNames, hardnessResults } from './hardness-results.ts'
import { rockwellChecks } from './rockwell/rockwell-checks.ts'
import { rockwellConversions } from './rockwell/rockwell-conversions.ts'
import { rockwellMisfits } from './rockwell/rockwell-fit.ts'
import { RockwellParameters, RockwellReadings } from './rockwell/rockwell-input.ts'
import { rockwellRules, rockwellStandards } from './rockwell/rockwell-rules.ts'
import { rockwellScale } from './rockwell/rockwell-scale.ts'

export const rockwell = defineMethod({
  id: 'rockwell',
  version: 1,
  title: 'Rockwell hardness',
  standards: rockwellStandards,
  parameters: RockwellParameters,
  readings: RockwellReadings,
  measured: [],
  resultNames: hardnessResultNames('HR', 'HR', 1),
  mainResult: 'mean',
  suggest: (piece) => ({
    standard: 'ASTM E18',
    scale: suggestedScale(piece),
    surface: { shape: 'flat' },
    ...(piece?.thicknessMm !== undefined && piece.form !== 'bar' && { thicknessMm: piece.thicknessMm }),
  }),
  label: ({ scale }) => `Rockwell ${scale}`,
  summary: ({ standard, surface }) =>
    `${rockwellRules[standard].edition}, 3 readings or more on ${surface.shape === 'flat' ? 'a flat' : `a cylinder of ${surface.diameterMm} mm`}`,
  needs: ({ scale, surface }) => [
    ...(surface.shape === 'flat' ? [{ kind: 'section' as const, capability: 'section', setupMinutes: 10, runMinutes: 5, attended: 'all' as const, needs: {} }] : []),
    {
      kind: 'measure', detail: scale, capability: 'rockwell', setupMinutes: 5, runMinutes: 6, attended: 'all',
      needs: { forceKgf: rockwellScale[scale].totalForceKgf, ...(surface.shape === 'cylinder' && { diameterMm: surface.diameterMm }) },
    },
  ],
  misfits: rockwellMisfits,
  cautions: ({ surface }) => [
    'Keep fingers clear of the indenter and the rising anvil; support long or heavy pieces so that they cannot tip.',
    ...(surface.shape === 'flat' ? ['Cutting: guard closed, coolant on, eye protection; let the cut face cool before it is touched.'] : ['Round pieces lie in a V-anvil that is centred under the indenter.']),
    'The machine\'s manual and the laboratory\'s own rules come first.',
  ],
  evaluate: ({ parameters, readings, uncertainty }) => {
    const { standard, scale, surface } = parameters
    const { edition, increment, rounding } = rockwellRules[standard]
    const raw = readings.map((reading) => reading.value)
    const values = surface.shape === 'flat' ? raw : raw.map((value) => value + cylinderCorrection(scale, value, surface.diameterMm))
    const spread = values.length > 1 ? { standardUncertainty: standardDeviation(values) / Math.sqrt(values.length), degreesOfFreedom: values.length - 1 } : undefined
    return {
      results: hardnessResults({
        values, scale, increment, rounding, basis: edition,
        steps: stepsFrom(parameters, raw, values),
        uncertainty: expanded(uncertainty, spread, scale),
      }),
      checks: rockwellChecks(parameters, readings, values),
    }
  },
  conversions: ({ parameters, results }) => rockwellConversions(parameters, results),
  report: ({ parameters: { standard, scale, surface, thicknessMm }, readings }) => {
    const { indenter, ballDiameterMm, totalForceKgf } = rockwellScale[scale]
    const tool = indenter === 'cone' ? 'diamond cone' : `tungsten carbide ball, ${ballDiameterMm} mm`
    return [
      `Rockwell hardness ${scale} by ${rockwellRules[standard].edition}: ${tool}, total force ${totalForceKgf} kgf.`,
      surface.shape === 'flat' ? 'Tested on a flat surface.' : `Tested on a convex cylinder of ${surface.diameterMm} mm; readings corrected by the tables of ASTM E18, which are approximate.`,
      ...(thicknessMm === undefined ? [] : [`Thickness at the test surface ${thicknessMm} mm.`]),
      `Readings as shown by the machine: ${listed(readings.map((reading) => reading.value), 100)} ${scale}.`,
    ]
  },
})

function suggestedScale(piece: Piece | undefined): RockwellParameters['scale'] {
  if (piece?.form !== 'sheet') return 'HRC'
  return (piece.thicknessMm ?? 0) >= 1.5 ? 'HRBW' : 'HR30TW'
}

function stepsFrom({ scale, surface }: RockwellParameters, raw: readonly number[], values: readonly number[]): DerivationStep[] {
  const read: DerivationStep = { text: `readings: ${listed(raw)} ${scale}` }
  if (surface.shape === 'flat') return [read]
  return [read, {
    text: `corrected for a convex cylinder of ${surface.diameterMm} mm: ${listed(values)} ${scale}`,
    formula: `corrections: ${listed(values.map((value, i) => value - (raw[i] ?? 0)))}`,
    clause: 'ASTM E18-22, corrections for convex cylinders, linear between rows and columns (approximate)',
  }]
}
