/** Density of the standard normal distribution. */
export function normalDensity(z: number): number {
  return Math.exp((-z * z) / 2) / Math.sqrt(2 * Math.PI)
}

/**
 * Probability that a standard normal variable lies below z. Series φ(z) Σ z^(2n+1)/(1·3·…·(2n+1)) near the middle, continued fraction in the
 * tails, so that the small side keeps its digits.
 * @example normalProbability(1.96) // 0.9750021…
 */
export function normalProbability(z: number): number {
  if (Number.isNaN(z)) throw new RangeError('the normal distribution needs a number')
  if (z < -3) return upperTail(-z)
  if (z > 3) return 1 - upperTail(z)
  let term = z
  let total = z
  for (let n = 1; n < 200 && Math.abs(term) > 1e-17 * Math.abs(total); n++) total += term *= (z * z) / (2 * n + 1)
  return 0.5 + normalDensity(z) * total
}

/** Q(z) = φ(z)/(z + 1/(z + 2/(z + …))) for z > 3. */
function upperTail(z: number): number {
  if (z > 40) return 0
  let tail = z
  for (let n = 120; n >= 1; n--) tail = z + n / tail
  return normalDensity(z) / tail
}
