/** A picture of a run as plain numbers, drawn alike on screen and on paper; each has a table of the same numbers. */
export type Picture = {
  title: string
  x: { label: string; unit: string }
  y: { label: string; unit: string }
  /** `curve` is the thing measured; `construction` and `dashed` are hairlines that explain it. */
  lines: { kind: 'curve' | 'construction' | 'dashed'; points: readonly (readonly [number, number])[] }[]
  marks: { x: number; y: number; label: string }[]
  /** A stretch of y that was used for a fit. */
  window?: { from: number; to: number }
}

/** Values carried over from a result by a published table: for orientation, never for acceptance unless agreed. */
export type Conversion = { table: string; caution: string; values: { scale: string; reported: string; informative: boolean }[] }
