import type { ComponentType } from 'react'
import type { TestRun } from '../../shared/api/test-runs.ts'
import type { Entry } from '../../shared/method/entries.ts'
import type { Check, Method, Result, Verdict } from '../../shared/method/method.ts'
import type { Conversion } from '../../shared/method/picture.ts'
import type { Typed } from '../lib/kept-readings/half-typed.ts'
import type { SheetReading } from '../lib/kept-readings/sheet-readings.ts'

/** What the readings give at this moment, worked out in the browser by the same engine that the server records with. */
export type Live = {
  parameters: Record<string, unknown>
  readings: unknown
  results: readonly Result[]
  checks: readonly Check[]
  verdict: Verdict | undefined
  /** Why there are no results, in words; empty when there are. */
  failure: string
  conversions: readonly Conversion[]
}

/** What a method's view gets from the sheet around it and may ask of it. Paths and values are those of `Entry`. */
export type SheetViewProps = {
  method: Method
  run: TestRun
  /** All of them, struck ones too, in the order they were kept. */
  readings: readonly SheetReading[]
  live: Live
  /** Half-typed fields; they survive a reload. */
  typed: Typed
  type: (change: Typed) => void
  keep: (entries: readonly Entry[]) => void
  /** Asks for a reason, then strikes out; with `refill`, what the row held is put into the fields to be typed again. */
  strike: (key: string, refill?: Typed) => void
  /** Asks for a reason, then strikes out and keeps the new value in its place. */
  replace: (key: string, entry: Entry) => void
  settle: { keepAs: (key: string, path: string) => void; drop: (key: string) => void; useMine: (key: string, other: string) => void }
  /** Why nothing can be kept now; empty when it can. */
  locked: string
  addRecord: (file: File, onProgress: (share: number) => void) => Promise<void>
  /** The main result without one reading; undefined when there is none. */
  without: (key: string) => Result | undefined
}
export type SheetView = ComponentType<SheetViewProps>
