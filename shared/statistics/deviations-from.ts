/** Each value less a centre, in the unit of both. */
export function deviationsFrom(values: ArrayLike<number>, centre: number): Float64Array {
  const deviations = new Float64Array(values.length)
  for (let i = 0; i < values.length; i++) deviations[i] = (values[i] ?? NaN) - centre
  return deviations
}
