import type { CorrectionTable } from '../rockwell/correction-table.ts'

/**
 * ASTM E18-22, corrections to be added to readings on convex cylinders: HRC, HRA and HRD, in HR units.
 * Diameters as headed in mm (rounded from 1/4 in, 3/8 in, …). Read in three public reprints with identical figures.
 */
export const cylinderCone: CorrectionTable = {
  diametersMm: [6.4, 10, 13, 16, 19, 22, 25, 32, 38],
  rows: [
    { reading: 20, corrections: [6, 4.5, 3.5, 2.5, 2, 1.5, 1.5, 1, 1] },
    { reading: 25, corrections: [5.5, 4, 3, 2.5, 2, 1.5, 1, 1, 1] },
    { reading: 30, corrections: [5, 3.5, 2.5, 2, 1.5, 1, 1, 1, 0.5] },
    { reading: 35, corrections: [4, 3, 2, 1.5, 1.5, 1, 1, 0.5, 0.5] },
    { reading: 40, corrections: [3.5, 2.5, 2, 1.5, 1, 1, 1, 0.5, 0.5] },
    { reading: 45, corrections: [3, 2, 1.5, 1, 1, 1, 0.5, 0.5, 0.5] },
    { reading: 50, corrections: [2.5, 2, 1.5, 1, 1, 0.5, 0.5, 0.5, 0.5] },
    { reading: 55, corrections: [2, 1.5, 1, 1, 0.5, 0.5, 0.5, 0.5, 0] },
    { reading: 60, corrections: [1.5, 1, 1, 0.5, 0.5, 0.5, 0.5, 0, 0] },
    { reading: 65, corrections: [1.5, 1, 1, 0.5, 0.5, 0.5, 0.5, 0, 0] },
    { reading: 70, corrections: [1, 1, 0.5, 0.5, 0.5, 0.5, 0.5, 0, 0] },
    { reading: 75, corrections: [1, 0.5, 0.5, 0.5, 0.5, 0.5, 0, 0, 0] },
    { reading: 80, corrections: [0.5, 0.5, 0.5, 0.5, 0.5, 0, 0, 0, 0] },
    { reading: 85, corrections: [0.5, 0.5, 0.5, 0, 0, 0, 0, 0, 0] },
    { reading: 90, corrections: [0.5, 0, 0, 0, 0, 0, 0, 0, 0] },
  ],
}
