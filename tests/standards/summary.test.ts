import { describe, expect, it } from 'vitest'
import { evaluate } from '../../shared/evaluate.ts'

/** Data and certified values: NIST Statistical Reference Datasets, univariate summary statistics (US government work). */
const lew = [
  -213, -564, -35, -15, 141, 115, -420, -360, 203, -338, -431, 194, -220, -513, 154, -125, -559, 92, -21, -579, -52, 99, -543,
  -175, 162, -457, -346, 204, -300, -474, 164, -107, -572, -8, 83, -541, -224, 180, -420, -374, 201, -236, -531, 83, 27, -564,
  -112, 131, -507, -254, 199, -311, -495, 143, -46, -579, -90, 136, -472, -338, 202, -287, -477, 169, -124, -568, 17, 48, -568,
  -135, 162, -430, -422, 172, -74, -577, -13, 92, -534, -243, 194, -355, -465, 156, -81, -578, -64, 139, -449, -384, 193, -198,
  -538, 110, -44, -577, -6, 66, -552, -164, 161, -460, -344, 205, -281, -504, 134, -28, -576, -118, 156, -437, -381, 200, -220,
  -540, 83, 11, -568, -160, 172, -414, -408, 188, -125, -572, -32, 139, -492, -321, 205, -262, -504, 142, -83, -574, 0, 48, -571,
  -106, 137, -501, -266, 190, -391, -406, 194, -186, -553, 83, -13, -577, -49, 103, -515, -280, 201, 300, -506, 131, -45, -578,
  -80, 138, -462, -361, 201, -211, -554, 32, 74, -533, -235, 187, -372, -442, 182, -147, -566, 25, 68, -535, -244, 194, -351,
  -463, 174, -125, -570, 15, 72, -550, -190, 172, -424, -385, 198, -218, -536, 96,
]
const mavro = [
  2.0018, 2.0017, 2.0018, 2.0019, 2.0018, 2.0017, 2.0015, 2.0014, 2.0015, 2.0015, 2.0017, 2.0018, 2.0018, 2.0019, 2.0019, 2.0021,
  2.002, 2.0016, 2.0014, 2.0013, 2.0013, 2.0015, 2.0015, 2.0016, 2.0015, 2.0014, 2.0013, 2.0014, 2.0015, 2.0014, 2.0015, 2.0016,
  2.0015, 2.0016, 2.0019, 2.002, 2.002, 2.0021, 2.0022, 2.0023, 2.0024, 2.0025, 2.0027, 2.0026, 2.0026, 2.0026, 2.0027, 2.0026,
  2.0025, 2.0024,
]
const alternating = (first: number, a: number, b: number) => [first, ...Array.from({ length: 1000 }, (_, i) => (i % 2 === 0 ? a : b))]

describe('summary against NIST StRD', () => {
  // NumAcc4 differs from its mean by 0.1 in ten million: its numbers hold that to eight figures once they are binary
  it.each([
    ['Lew', lew, -177.435, 277.332168044316, -0.307304800605679, 13],
    ['Mavro', mavro, 2.001856, 0.000429123454003053, 0.937989183438248, 11],
    ['NumAcc1', [10000001, 10000003, 10000002], 10000002, 1, -0.5, 14],
    ['NumAcc2', alternating(1.2, 1.1, 1.3), 1.2, 0.1, -0.999, 13],
    ['NumAcc4', alternating(10000000.2, 10000000.1, 10000000.3), 10000000.2, 0.1, -0.999, 8],
  ] as const)('%s', (_, values, mean, deviation, correlation, figures) => {
    const answer = evaluate({ tool: 'summary', values: [...values] }) as unknown as Record<string, number>
    expect(answer.count).toBe(values.length)
    expect(agreeing(answer.mean, mean)).toBeGreaterThanOrEqual(14)
    expect(agreeing(answer.standardDeviation, deviation)).toBeGreaterThanOrEqual(figures)
    expect(agreeing(answer.lag1Autocorrelation, correlation)).toBeGreaterThanOrEqual(figures)
  })
})

/** Figures to which a value agrees with the certified one (NIST's log relative error). */
function agreeing(value: number | undefined, certified: number): number {
  return value === certified ? 15 : -Math.log10(Math.abs((value ?? NaN) - certified) / Math.abs(certified))
}
