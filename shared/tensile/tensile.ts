import { defineMethod } from '../method/define-method.ts'
import { evaluateTensile } from './evaluate-tensile.ts'
import { misfits, sizeOf } from './plan/misfits.ts'
import { steps } from './plan/steps.ts'
import { usualTestPiece } from './plan/test-piece.ts'
import { plain } from './section-area.ts'
import { TensileParameters, tensileStandards } from './tensile-parameters.ts'
import { TensileReadings } from './tensile-readings.ts'
import { tensilePictures } from './tensile-pictures.ts'
import { tensileReport } from './tensile-report.ts'

/** Tensile test at room temperature: from sizes, forces and a load-extension record to strengths, elongations and reduction of area. */
export const tensile = defineMethod({
  id: 'tensile',
  version: 1,
  title: 'Tensile',
  standards: tensileStandards,
  parameters: TensileParameters,
  readings: TensileReadings,
  measured: ['section', 'originalGaugeLengthMm', 'extensometerGaugeLengthMm', 'elasticWindow'],
  resultNames: [
    { key: 'area', symbol: 'S0', name: 'original cross-section', unit: 'mm2', decimals: 2 },
    { key: 'slope', symbol: 'mE', name: 'slope of the elastic line', unit: 'MPa', decimals: 0 },
    { key: 'proofStrength', symbol: 'Rp', name: 'proof strength', unit: 'MPa', decimals: 0 },
    { key: 'upperYield', symbol: 'ReH', name: 'upper yield strength', unit: 'MPa', decimals: 0 },
    { key: 'lowerYield', symbol: 'ReL', name: 'lower yield strength', unit: 'MPa', decimals: 0 },
    { key: 'yieldPointExtension', symbol: 'Ae', name: 'yield point extension', unit: '%', decimals: 1 },
    { key: 'tensileStrength', symbol: 'Rm', name: 'tensile strength', unit: 'MPa', decimals: 0 },
    { key: 'extensionAtMaximum', symbol: 'Agt', name: 'extension at maximum force', unit: '%', decimals: 1 },
    { key: 'uniformElongation', symbol: 'Ag', name: 'uniform elongation', unit: '%', decimals: 1 },
    { key: 'elongation', symbol: 'A', name: 'elongation after fracture', unit: '%', decimals: 1 },
    { key: 'reductionOfArea', symbol: 'Z', name: 'reduction of area', unit: '%', decimals: 1 },
    { key: 'yieldRatio', symbol: 'Rp/Rm', name: 'yield ratio', unit: '', decimals: 3 },
  ],
  mainResult: 'tensileStrength',
  suggest: (piece) => ({ standard: 'ISO 6892-1', offsetPercent: 0.2, ...usualTestPiece(piece, 'ISO 6892-1') }),
  label: () => 'Tensile',
  summary: ({ standard, section, originalGaugeLengthMm }) =>
    [standard, section && sizeOf(section), originalGaugeLengthMm !== undefined && `L0 ${plain(originalGaugeLengthMm)} mm`].filter(Boolean).join(', '),
  needs: steps,
  misfits,
  cautions: () => [
    'Guards closed and people clear: frame and test piece store energy until the force reads zero.',
    'Eye protection: hard and brittle test pieces throw fragments when they part.',
    'Hands off between grips and crossheads while the frame can move; know where its stop is.',
    'The fracture is sharp and may be hot.',
  ],
  evaluate: evaluateTensile,
  report: tensileReport,
  pictures: tensilePictures,
})
