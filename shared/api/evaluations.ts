import * as z from 'zod'
import { endpoint } from './endpoint.ts'

/** The engine's answer as it is stored with a run; the same shapes as `shared/method/method.ts`. */
export const DerivationStep = z.object({ text: z.string(), formula: z.string().optional(), clause: z.string().optional(), value: z.number().optional(), unit: z.string().optional(), reported: z.string().optional() })
export const Result = z.object({
  key: z.string(), symbol: z.string(), value: z.number(), unit: z.string(), reported: z.string(), expandedUncertainty: z.number().optional(), coverageFactor: z.number().optional(),
  basis: z.string(), approximate: z.boolean(), derivation: z.array(DerivationStep),
})
export const Check = z.object({ code: z.string(), severity: z.enum(['error', 'warning', 'info']), message: z.string(), reading: z.int().optional() })
const Outcome = z.enum(['pass', 'fail', 'undecided'])
export const Verdict = z.object({
  outcome: Outcome, rule: z.enum(['simple', 'guarded']),
  limits: z.array(z.object({ key: z.string(), outcome: Outcome, lower: z.number().optional(), upper: z.number().optional(), probabilityOfConformity: z.number().optional() })),
})
export const Evaluation = z.object({ method: z.string(), results: z.array(Result), checks: z.array(Check), verdict: Verdict.optional() })

/** The engine over HTTP: one case or an array of cases in, the same shape out; nothing is saved. */
export const evaluateCase = endpoint({ method: 'post', path: '/evaluate', can: 'signed-in', body: z.json(), response: z.json() })

/** A method as it is offered: price, usual working days, and the sites that have it in scope. */
export const MethodOffer = z.object({ methodId: z.string(), priceMinor: z.int(), currency: z.string(), siteIds: z.array(z.uuid()) })
export type MethodOffer = z.infer<typeof MethodOffer>
export const Site = z.object({ id: z.uuid(), name: z.string(), address: z.string(), timeZone: z.string() })
export type Site = z.infer<typeof Site>
export const readCatalogue = endpoint({ method: 'get', path: '/catalogue', can: ['read', 'MethodOffer'], response: z.object({ offers: z.array(MethodOffer), sites: z.array(Site) }) })

export const evaluationEndpoints = [evaluateCase, readCatalogue]
