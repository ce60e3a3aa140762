import { tQuantile } from './t-quantile.ts'

/** A share of the uncertainty budget: u in its own unit, c to turn it into the result's, v when u was itself estimated. */
export type BudgetLine = { standardUncertainty: number; sensitivity?: number; degreesOfFreedom?: number }

export type Combined = {
  combined: number
  /** By Welch-Satterthwaite, not cut; null when infinite. */
  effectiveDegreesOfFreedom: number | null
  coverageFactor: number
  expanded: number
}

/** Coverage of an expanded uncertainty with k = 2 for a normal distribution. */
export const usualConfidence = 0.9545

/**
 * Combined and expanded uncertainty (JCGM 100:2008, 5.1.2 and Annex G.4): u_c = √Σ(c u)², v_eff = u_c⁴ / Σ((c u)⁴/v), U = k u_c with k from
 * Student's t at v_eff cut to a whole number (G.4.1).
 * @example combineUncertainty([{ standardUncertainty: 0.3 }, { standardUncertainty: 0.4 }]).combined // 0.5
 */
export function combineUncertainty(lines: readonly BudgetLine[], confidence = usualConfidence): Combined {
  if (lines.length === 0) throw new RangeError('an uncertainty needs at least one component')
  if (!(confidence > 0 && confidence < 1)) throw new RangeError(`the confidence must lie between 0 and 1, not ${confidence}`)
  const shares = lines.map((line) => ({ u: Math.abs((line.sensitivity ?? 1) * line.standardUncertainty), v: line.degreesOfFreedom ?? Infinity }))
  const combined = Math.hypot(...shares.map((share) => share.u))
  // relative to the whole, so that the fourth powers neither overflow nor vanish
  const spread = combined === 0 ? 0 : shares.reduce((total, share) => total + (share.u / combined) ** 4 / share.v, 0)
  const effective = spread > 0 ? 1 / spread : null
  // 3.9999999999 degrees of freedom are four: the cut must not fall for binary noise
  const cut = effective === null ? Infinity : Math.max(1, Math.floor(effective * (1 + 1e-12)))
  const coverageFactor = tQuantile((1 + confidence) / 2, cut)
  return { combined, effectiveDegreesOfFreedom: effective, coverageFactor, expanded: coverageFactor * combined }
}
