/** Readings written out for a derivation: all of them up to twenty, then how many more there are. */
export function listed(values: readonly number[], most = 20): string {
  const shown = values.slice(0, most).map((value) => String(Number(value.toPrecision(8)))).join(', ')
  return values.length > most ? `${shown} and ${values.length - most} more` : shown
}
