import type { CorrectionTable } from '../rockwell/correction-table.ts'

/**
 * ASTM E18-22, corrections to be added to readings on convex cylinders: HRB, HRF and HRG (1/16 in ball), in HR units.
 * Diameters as headed in mm (rounded from 1/4 in, 3/8 in, …). Read in three public reprints with identical figures.
 */
export const cylinderBall: CorrectionTable = {
  diametersMm: [6.4, 10, 13, 16, 19, 22, 25],
  rows: [
    { reading: 0, corrections: [12.5, 8.5, 6.5, 5.5, 4.5, 3.5, 3] },
    { reading: 10, corrections: [12, 8, 6, 5, 4, 3.5, 3] },
    { reading: 20, corrections: [11, 7.5, 5.5, 4.5, 4, 3.5, 3] },
    { reading: 30, corrections: [10, 6.5, 5, 4.5, 3.5, 3, 2.5] },
    { reading: 40, corrections: [9, 6, 4.5, 4, 3, 2.5, 2.5] },
    { reading: 50, corrections: [8, 5.5, 4, 3.5, 3, 2.5, 2] },
    { reading: 60, corrections: [7, 5, 3.5, 3, 2.5, 2, 2] },
    { reading: 70, corrections: [6, 4, 3, 2.5, 2, 2, 1.5] },
    { reading: 80, corrections: [5, 3.5, 2.5, 2, 1.5, 1.5, 1.5] },
    { reading: 90, corrections: [4, 3, 2, 1.5, 1.5, 1.5, 1] },
    { reading: 100, corrections: [3.5, 2.5, 1.5, 1.5, 1, 1, 0.5] },
  ],
}
