/** Σ a b of two lists of equal length, with the rounding error of adding carried along (Neumaier). */
export function sumOfProducts(a: ArrayLike<number>, b: ArrayLike<number>, length = a.length): number {
  let total = 0
  let lost = 0
  for (let i = 0; i < length; i++) {
    const value = (a[i] ?? NaN) * (b[i] ?? NaN)
    const next = total + value
    lost += Math.abs(total) >= Math.abs(value) ? total - next + value : value - next + total
    total = next
  }
  return total + lost
}
