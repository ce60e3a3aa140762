/**
 * One thing kept at the bench. `path` says where it belongs in the engine's input: `readings.0` for a row of a set,
 * `readings.curve` for a named reading, `parameters.section` for a parameter measured at the bench.
 */
export type Entry = { path: string; value: unknown }

/**
 * Puts what was ordered and what was kept at the bench together into the engine's input. Rows of a set are closed up
 * in the order of their numbers, so a struck-out row leaves no gap; a later parameter replaces an earlier one.
 * `isSet` is the method's: whether its readings are rows or named values.
 */
export function inputOf(ordered: Record<string, unknown>, live: readonly Entry[], isSet: boolean): { parameters: Record<string, unknown>; readings: unknown } {
  const parameters = { ...ordered }
  const rows: { at: number; value: unknown }[] = []
  const named: Record<string, unknown> = {}
  for (const { path, value } of live) {
    const [side, key] = splitPath(path)
    if (side === 'parameters') parameters[key] = value
    else if (/^\d+$/.test(key)) rows.push({ at: Number(key), value })
    else named[key] = value
  }
  return { parameters, readings: isSet ? rows.sort((a, b) => a.at - b.at).map((row) => row.value) : named }
}

/** The two halves of a path; throws RangeError for a path that names neither side. */
export function splitPath(path: string): ['parameters' | 'readings', string] {
  const [side, key, more] = path.split('.')
  if ((side !== 'parameters' && side !== 'readings') || !key || more !== undefined) throw new RangeError(`no such place for a reading: ${path}`)
  return [side, key]
}
