export const grainStandards = ['ASTM E112', 'ISO 643'] as const
export type GrainStandard = (typeof grainStandards)[number]

/** Edition meant, and the constant of G = 6.643856 log10(N_L) − c (from memory: E112 prints 3.288; ISO 643 is 2 log2 0.320 = −3.2877). */
export const grainRules: Record<GrainStandard, { edition: string; constant: number }> = {
  'ASTM E112': { edition: 'ASTM E112-13(2021)', constant: 3.288 },
  'ISO 643': { edition: 'ISO 643:2019', constant: 3.2877 },
}

/** 2/log10(2): G rises by two when the intercept is halved. */
export const perDecade = 2 / Math.log10(2)

/**
 * Grain size number G from the intercepts per mm of test line on the specimen, G = 6.643856 log10(N_L) − 3.288 (ASTM E112; ISO 643 with 3.2877);
 * N_L above 0.
 * @example grainSizeNumber(17.4, 'ASTM E112') // 4.954
 */
export function grainSizeNumber(interceptsPerMm: number, standard: GrainStandard): number {
  if (!(interceptsPerMm > 0)) throw new RangeError(`a grain size needs more than ${interceptsPerMm} intercepts per mm`)
  return perDecade * Math.log10(interceptsPerMm) - grainRules[standard].constant
}
