import * as z from 'zod'
import type { Check, Method, Misfit, Result, ResultName, StepNeed, UncertaintyComponent } from './method.ts'
import { orderedParameters } from './ordered-parameters.ts'
import type { Conversion, Picture } from './picture.ts'
import type { Piece } from './piece.ts'
import { Uncertainty } from './uncertainty.ts'

/** Parameters as far as they are known when the test is ordered: those measured at the bench may be missing. */
type Ordered<P, M extends keyof P> = Omit<P, M> & Partial<Pick<P, M>>

/** A method with the types that its schemas give: `P` what is ordered, `R` what is read, `M` the keys of `P` that are measured at the bench. */
export type MethodDefinition<P, R, M extends keyof P & string> =
  Pick<Method, 'id' | 'version' | 'title' | 'standards' | 'mainResult'> & {
    parameters: z.ZodType<P>
    readings: z.ZodType<R>
    measured: readonly M[]
    resultNames: readonly ResultName[]
    suggest(piece?: Piece): Record<string, unknown>
    label(parameters: Ordered<P, M>): string
    summary(parameters: Ordered<P, M>): string
    needs(parameters: Ordered<P, M>): StepNeed[]
    misfits(parameters: Ordered<P, M>, piece: Piece): Misfit[]
    cautions(parameters: Ordered<P, M>): string[]
    /** Throws RangeError where a table has no answer. `uncertainty` holds what is known besides the spread of the readings. */
    evaluate(input: { parameters: P; readings: R; uncertainty?: { components: UncertaintyComponent[] } }): { results: Result[]; checks: Check[] }
    report(input: { parameters: P; readings: R; results: Result[] }): string[]
    pictures?(input: { parameters: P; readings: R }): Picture[]
    conversions?(input: { parameters: P; results: Result[] }): Conversion[]
  }

/**
 * Makes a method out of a typed definition. Everything that comes from outside is parsed by the two schemas before the
 * definition sees it; the result hides their types, so that all methods share one list.
 */
export function defineMethod<P, R, const M extends keyof P & string = never>(definition: MethodDefinition<P, R, M>): Method {
  const { id, version, title, standards, parameters, readings, measured, resultNames, mainResult } = definition
  // the compiler cannot follow a schema built from type parameters; these two lines say what it holds
  const input = z.strictObject({ parameters, readings, uncertainty: Uncertainty.optional() }) as z.ZodType<{ parameters: P; readings: R; uncertainty?: Uncertainty }>
  const orderedSchema = orderedParameters(parameters, measured) as z.ZodType<Ordered<P, M>>
  const ordered = (raw: unknown) => orderedSchema.parse(raw)
  return {
    id, version, title, standards, parameters, readings, measured, resultNames, mainResult,
    isSet: readings instanceof z.ZodArray,
    suggest: (piece) => definition.suggest(piece),
    label: (raw) => definition.label(ordered(raw)),
    summary: (raw) => definition.summary(ordered(raw)),
    needs: (raw) => definition.needs(ordered(raw)),
    misfits: (raw, piece) => definition.misfits(ordered(raw), piece),
    cautions: (raw) => definition.cautions(ordered(raw)),
    evaluate: (raw) => definition.evaluate(input.parse(raw)),
    report: ({ parameters: rawParameters, readings: rawReadings, results }) =>
      definition.report({ parameters: parameters.parse(rawParameters), readings: readings.parse(rawReadings), results }),
    ...(definition.pictures && { pictures: (raw: { parameters: unknown; readings: unknown }) => definition.pictures?.({ parameters: parameters.parse(raw.parameters), readings: readings.parse(raw.readings) }) ?? [] }),
    ...(definition.conversions && { conversions: (raw: { parameters: unknown; results: Result[] }) => definition.conversions?.({ parameters: parameters.parse(raw.parameters), results: raw.results }) ?? [] }),
  }
}
