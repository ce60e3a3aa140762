/** Sum with the rounding error carried along (Neumaier), so that a million readings add up as well as three. Any unit. */
export function sum(values: ArrayLike<number>): number {
  let total = 0
  let lost = 0
  for (let i = 0; i < values.length; i++) {
    const value = values[i] ?? 0
    const next = total + value
    lost += Math.abs(total) >= Math.abs(value) ? total - next + value : value - next + total
    total = next
  }
  return total + lost
}
