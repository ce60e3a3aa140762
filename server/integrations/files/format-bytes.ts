/** A size for people: binary multiples up to MiB, at most one decimal place. */
export function formatBytes(bytes: number): string {
  if (bytes < 1024) return `${bytes} bytes`
  const [value, unit] = bytes < 1024 * 1024 ? [bytes / 1024, 'KiB'] : [bytes / (1024 * 1024), 'MiB']
  return `${Number(value.toFixed(1))} ${unit}`
}
