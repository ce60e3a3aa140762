import * as z from 'zod'
import { column } from './column.ts'

/** Forces up to 50 MN and extensions up to 5 m: beyond any frame, so that a wrong unit is found. */
const Force = z.number().positive().max(50_000_000)
const lengthMm = (most: number) => z.number().positive().max(most)

/** A load-extension record. Columns of equal length; small negative extensions and steps back are real and allowed. */
export const TensileCurve = z
  .strictObject({
    extensionMm: column(5000).meta({ label: 'Extension', unit: 'mm' }),
    forceN: column(50_000_000).meta({ label: 'Force', unit: 'N' }),
    timeS: column(10_000_000).optional().meta({ label: 'Time', unit: 's' }),
  })
  .superRefine(({ extensionMm, forceN, timeS }, context) => {
    const unequal = (key: string, length: number) =>
      context.addIssue({ code: 'custom', path: [key], message: `has ${length} points, but the force has ${forceN.length}` })
    if (extensionMm.length !== forceN.length) unequal('extensionMm', extensionMm.length)
    if (timeS && timeS.length !== forceN.length) unequal('timeS', timeS.length)
  })
export type TensileCurve = z.infer<typeof TensileCurve>

export const TensileReadings = z.strictObject({
  curve: TensileCurve.optional().meta({ label: 'Force and extension' }),
  maximumForceN: Force.optional().meta({ label: 'Maximum force Fm', unit: 'N', step: 1 }),
  proofForceN: Force.optional().meta({ label: 'Force at the proof strength', unit: 'N', step: 1 }),
  upperYieldForceN: Force.optional().meta({ label: 'Upper yield force', unit: 'N', step: 1 }),
  lowerYieldForceN: Force.optional().meta({ label: 'Lower yield force', unit: 'N', step: 1 }),
  finalGaugeLengthMm: lengthMm(10_000).optional().meta({ label: 'Final gauge length Lu', unit: 'mm', step: 0.01 }),
  finalDiametersMm: z.array(lengthMm(500)).min(1).max(20).optional().meta({ label: 'Least diameter after fracture du', unit: 'mm', step: 0.01 }),
  finalThicknessMm: lengthMm(500).optional().meta({ label: 'Least thickness after fracture', unit: 'mm', step: 0.01 }),
  finalWidthMm: lengthMm(2000).optional().meta({ label: 'Greatest width at the fracture', unit: 'mm', step: 0.01 }),
  fractureFromNearerMarkMm: z.number().nonnegative().max(2000).optional().meta({ label: 'Fracture from the nearer mark', unit: 'mm', step: 0.1 }),
})
export type TensileReadings = z.infer<typeof TensileReadings>
