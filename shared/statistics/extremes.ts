/** Least and greatest value, one or more values; in one pass, so that a long record does not overflow an argument list. */
export function extremes(values: ArrayLike<number>): { minimum: number; maximum: number; range: number } {
  let minimum = Infinity
  let maximum = -Infinity
  for (let i = 0; i < values.length; i++) {
    const value = values[i] ?? NaN
    if (value < minimum) minimum = value
    if (value > maximum) maximum = value
  }
  if (!(minimum <= maximum)) throw new RangeError('the extremes need at least one value')
  return { minimum, maximum, range: maximum - minimum }
}
