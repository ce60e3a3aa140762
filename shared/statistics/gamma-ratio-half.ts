/**
 * Γ(a + 1/2) / Γ(a) for a > 0: the recurrence R(a) = R(a + 1) · a/(a + 1/2) up to a ≥ 30, then the asymptotic series
 * √a (1 − 1/8a + 1/128a² + 5/1024a³ − 21/32768a⁴ − 399/262144a⁵ + 869/4194304a⁶).
 * @example gammaRatioHalf(0.5) // 1/√π
 */
export function gammaRatioHalf(a: number): number {
  if (!(a > 0)) throw new RangeError(`the ratio of gamma functions needs a > 0, not ${a}`)
  let factor = 1
  let at = a
  for (; at < 30; at++) factor *= at / (at + 0.5)
  const u = 1 / at
  const series = 1 + u * (-1 / 8 + u * (1 / 128 + u * (5 / 1024 + u * (-21 / 32768 + u * (-399 / 262144 + (u * 869) / 4194304)))))
  return factor * Math.sqrt(at) * series
}
