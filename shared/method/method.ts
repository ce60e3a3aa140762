import type * as z from 'zod'
import type { Conversion, Picture } from './picture.ts'
import type { Piece } from './piece.ts'

/** One line of how a result came about. The last line of a derivation equals `reported`. */
export type DerivationStep = {
  text: string
  /** The formula with its values put in, for people. */
  formula?: string
  /** The clause or definition it follows. */
  clause?: string
  value?: number
  unit?: string
  reported?: string
}

/** One reported number: `value` in full precision, `reported` rounded by the named rule with unit or designation. */
export type Result = {
  key: string
  symbol: string
  value: number
  unit: string
  reported: string
  expandedUncertainty?: number
  coverageFactor?: number
  /** The standard whose rules gave this number. */
  basis: string
  approximate: boolean
  derivation: DerivationStep[]
}

/** `error`: the run cannot be accepted. `warning`: going on needs a remark. `info`: worth knowing. */
export type Severity = 'error' | 'warning' | 'info'

/** A rule of the method that the readings break, or something worth knowing. `reading` counts from 0. */
export type Check = { code: string; severity: Severity; message: string; reading?: number }

export type Limit = { key: string; lower?: number; upper?: number }
export type Requirement = { limits: Limit[]; rule: 'simple' | 'guarded' }
export type UncertaintyComponent = { name: string; standardUncertainty: number; sensitivity?: number; degreesOfFreedom?: number }
export type Outcome = 'pass' | 'fail' | 'undecided'
export type Verdict = {
  outcome: Outcome
  rule: Requirement['rule']
  limits: { key: string; outcome: Outcome; lower?: number; upper?: number; probabilityOfConformity?: number }[]
}

export type Evaluation = { method: string; results: Result[]; checks: Check[]; verdict?: Verdict }

/** What a person does to a sample; the words of the traveller. */
export type StepKind = 'section' | 'machine' | 'mount' | 'grind and polish' | 'etch' | 'measure' | 'pull'

/** One step that a method asks for, as the planner wants it. */
export type StepNeed = {
  kind: StepKind
  /** Said after the kind where one sample has several: "measure HRC". */
  detail?: string
  /** What the bench must be able to do and the person be allowed to do: a kind of preparation, or the method's id. */
  capability: string
  setupMinutes: number
  runMinutes: number
  attended: 'all' | 'setup' | 'none'
  /** Numbers that must lie inside the bench's limits of the same names. */
  needs: Record<string, number>
}

/** Something about a sample that the method cannot take, said at order, with ways out. */
export type Misfit = { message: string; cures: { label: string; parameters: Record<string, unknown> }[] }

/** A number that the method can report: what requirements, tables and charts may name. */
export type ResultName = { key: string; symbol: string; name: string; unit: string; decimals: number }

/**
 * A way to test, by published standard. `parameters` are what the client orders, `readings` what the technician
 * enters; both schemas are form, check and type at once. Everything else in the product learns of a method from here.
 */
export type Method = {
  id: string
  /** Raised whenever a formula changes; stored evaluations keep theirs. */
  version: number
  title: string
  standards: readonly string[]
  parameters: z.ZodType
  readings: z.ZodType
  /** Whether readings are rows of a set (an array) or named values (an object). */
  isSet: boolean
  /** Keys of `parameters` that are measured or chosen at the bench, not ordered. */
  measured: readonly string[]
  resultNames: readonly ResultName[]
  /** The key of `resultNames` that a list or a label shows. */
  mainResult: string
  /** Parameters to start from for a test piece, before the client changes them. */
  suggest(piece?: Piece): Record<string, unknown>
  /** Short name with its scale or load, as on a label: "Rockwell HRC". */
  label(parameters: unknown): string
  /** One line of how it is done: "ASTM E18, 3 readings or more". */
  summary(parameters: unknown): string
  needs(parameters: unknown): StepNeed[]
  /** What the method cannot take of this piece; empty when it fits. */
  misfits(parameters: unknown, piece: Piece): Misfit[]
  /** Usual cautions for the people at the bench; local rules and the lab's own safety sheet come first. */
  cautions(parameters: unknown): string[]
  /** Checks raw input and calculates. Throws ZodError for input that cannot be read, RangeError where a table has no answer. */
  evaluate(input: { parameters: unknown; readings: unknown; uncertainty?: { components: UncertaintyComponent[] } }): { results: Result[]; checks: Check[] }
  /** Lines of the report that say how it was tested. */
  report(input: { parameters: unknown; readings: unknown; results: Result[] }): string[]
  /** Pictures of a run, where people would rather look than read. */
  pictures?(input: { parameters: unknown; readings: unknown }): Picture[]
  /** The main result by published tables, where they have an answer. */
  conversions?(input: { parameters: unknown; results: Result[] }): Conversion[]
}
