/** Corrections for readings on convex cylinders as printed: columns by diameter, rows by reading. */
export type CorrectionTable = { diametersMm: readonly number[]; rows: readonly { reading: number; corrections: readonly number[] }[] }
