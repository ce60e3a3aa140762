import { gammaRatioHalf } from './gamma-ratio-half.ts'

const ACCURACY = 1e-15
const MOST_TERMS = 20000

/**
 * Regularised incomplete beta function I_x(a, 1/2), the one that Student's t needs; a > 0, `x` and `y` = 1 − x in [0, 1], both given
 * so that neither loses its digits; answered with its complement for the same reason. Continued fraction by the modified Lentz
 * method (DLMF 8.17.22).
 * @example incompleteBetaHalf(1, 0.75, 0.25) // { value: 0.5, complement: 0.5 }
 */
export function incompleteBetaHalf(a: number, x: number, y: number): { value: number; complement: number } {
  if (!(a > 0) || !(x >= 0 && x <= 1)) throw new RangeError(`the incomplete beta function has no value at a = ${a}, x = ${x}`)
  if (x === 0) return { value: 0, complement: 1 }
  if (y === 0) return { value: 1, complement: 0 }
  // x^a (1 - x)^(1/2) / B(a, 1/2), with B(a, 1/2) = √π Γ(a)/Γ(a + 1/2)
  const logX = x > 0.5 ? Math.log1p(-y) : Math.log(x)
  const front = (Math.exp(a * logX) * Math.sqrt(y) * gammaRatioHalf(a)) / Math.sqrt(Math.PI)
  if (x < (a + 1) / (a + 2.5)) {
    const value = (front * fraction(a, 0.5, x)) / a
    return { value, complement: 1 - value }
  }
  const complement = (front * fraction(0.5, a, y)) / 0.5
  return { value: 1 - complement, complement }
}

function fraction(a: number, b: number, x: number): number {
  const tiny = 1e-300
  const notZero = (value: number) => (Math.abs(value) < tiny ? tiny : value)
  let c = 1
  let d = 1 / notZero(1 - ((a + b) * x) / (a + 1))
  let h = d
  for (let m = 1; m <= MOST_TERMS; m++) {
    const even = (m * (b - m) * x) / ((a + 2 * m - 1) * (a + 2 * m))
    d = 1 / notZero(1 + even * d)
    c = notZero(1 + even / c)
    h *= d * c
    const odd = (-(a + m) * (a + b + m) * x) / ((a + 2 * m) * (a + 2 * m + 1))
    d = 1 / notZero(1 + odd * d)
    c = notZero(1 + odd / c)
    h *= d * c
    if (Math.abs(d * c - 1) < ACCURACY) return h
  }
  throw new RangeError(`the incomplete beta function did not converge at a = ${a}, b = ${b}, x = ${x}`)
}
