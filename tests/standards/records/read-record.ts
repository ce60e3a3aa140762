import { readFileSync } from 'node:fs'

/** A file beside this one, as text. */
export function recordText(path: string): string {
  return readFileSync(new URL(path, import.meta.url), 'utf8')
}

/** Columns of numbers of a record beside this one, by name. */
export function readRecord(path: string): Record<string, number[]> {
  const [heading = '', ...rows] = recordText(path).trim().split(/\r?\n/)
  const names = heading.split(',')
  const cells = rows.map((row) => row.split(',').map(Number))
  return Object.fromEntries(names.map((name, k) => [name, cells.map((row) => row[k] ?? NaN)]))
}

/** The curve of a record: force and extension, or strain and stress for a test piece of the given size. */
export function curveOf(path: string, areaMm2: number, gaugeLengthMm: number): { extensionMm: number[]; forceN: number[] } {
  const record = readRecord(path)
  const { strain, stress_MPa: stress, extension_mm: extensionMm, force_N: forceN } = record
  if (extensionMm && forceN) return { extensionMm, forceN }
  if (!strain || !stress) throw new Error(`${path} holds neither force and extension nor stress and strain`)
  return { extensionMm: strain.map((value) => value * gaugeLengthMm), forceN: stress.map((value) => value * areaMm2) }
}
