/**
 * The number without the noise of binary arithmetic: 25.400000000000002 is 25.4. Used before a value is held against a
 * limit, so that a result exactly on the limit meets it.
 */
export function settled(value: number): number {
  return Number(value.toPrecision(13))
}
