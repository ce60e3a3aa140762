/** Scales that the published conversion tables know; the last is a strength, in MPa. */
export const conversionScales = [
  'HV', 'HBW', 'HK', 'HRA', 'HRB', 'HRC', 'HRD', 'HRF', 'HR15N', 'HR30N', 'HR45N', 'HR15T', 'HR30T', 'HR45T', 'tensileStrengthMPa',
] as const
export type ConversionScale = (typeof conversionScales)[number]
