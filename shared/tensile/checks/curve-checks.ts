import type { Check } from '../../method/method.ts'
import { significant } from '../../units/significant.ts'
import type { CurveAnalysis } from '../analysis/analyse-curve.ts'
import type { ElasticLine } from '../analysis/elastic-line.ts'
import { proofSymbol } from '../results/strengths.ts'
import type { TensileParameters } from '../tensile-parameters.ts'
import type { TensileReadings } from '../tensile-readings.ts'

/** What the curve shows beside its numbers: a doubtful elastic line, discontinuous yielding, no maximum, an early end. */
export function curveChecks(analysis: CurveAnalysis, parameters: TensileParameters, readings: TensileReadings, areaMm2: number): Check[] {
  const checks: Check[] = []
  const warn = (code: string, message: string) => checks.push({ code, severity: 'warning', message })
  const { line, proof, yielding, maximum, highest, fracture, end } = analysis
  for (const message of line ? doubts(line) : [missing(parameters)]) warn('elastic-fit', message)
  if (yielding) {
    checks.push({ code: 'discontinuous-yielding', severity: 'info', message: `yielding is discontinuous, from ${significant(yielding.upper.stress, 4)} MPa: the upper and lower yield strengths describe it` })
    if (!maximum || maximum.stress < yielding.upper.stress) warn('maximum-at-upper-yield', atUpperYield(analysis, parameters))
  }
  const reached = maximum ?? highest
  if (standsAlone(analysis, highest.index)) {
    warn('force-spike', `the highest force is a single reading far above its neighbours, ${significant(highest.stress, 4)} MPa: look at the record`)
  }
  if (!reached.isReached) {
    warn('no-maximum', end.unloaded
      ? 'the test piece was unloaded before the force had reached a maximum: Rm is at least the value given, and there is no Ag'
      : 'the force never falls within the record: Rm is at least the value given, and there is no Ag')
  }
  if (line && !proof) warn('curve-too-short', `the record ends before the offset of ${parameters.offsetPercent} %: no ${proofSymbol(parameters.offsetPercent)}`)
  if (end.lastExtension < end.last) {
    const which = end.lastExtension < reached.index ? 'before the maximum force: no Agt, Ag and A from the curve' : 'before fracture: no A from the curve'
    warn('curve-too-short', `the extensometer stood still or came off ${which}`)
  } else if (!fracture && readings.finalGaugeLengthMm === undefined) {
    warn('curve-too-short', 'the record does not reach fracture and no final gauge length was measured: no A')
  }
  const typed = readings.maximumForceN
  if (typed !== undefined && reached.isReached && Math.abs(typed / (highest.stress * areaMm2) - 1) > 0.005) {
    warn('forces-disagree', `the maximum force typed in, ${significant(typed, 5)} N, and that of the record, ${significant(highest.stress * areaMm2, 5)} N, differ by more than 0.5 %: the record counts`)
  }
  return checks
}

/** One reading by a fiftieth above both neighbours, well before the end: an electrical fault rather than the test piece. */
function standsAlone({ curve: { stress }, end }: CurveAnalysis, index: number): boolean {
  const [before, here, after] = [stress[index - 1], stress[index], stress[index + 1]]
  if (before === undefined || here === undefined || after === undefined || index + 1 > end.last) return false
  return here > 1.02 * Math.max(before, after) && Math.abs(before - after) < 0.02 * here
}

function missing({ elasticWindow }: TensileParameters): string {
  return elasticWindow
    ? `fewer than 3 points rise between ${elasticWindow.fromMPa} and ${elasticWindow.toMPa} MPa: no elastic line and nothing that needs one`
    : 'no straight rise found in the record: no elastic line and nothing that needs one'
}

function atUpperYield({ maximum, yielding }: CurveAnalysis, { standard }: TensileParameters): string {
  const upper = significant(yielding?.upper.stress ?? 0, 4)
  const isAstm = standard === 'ASTM E8/E8M'
  if (maximum) {
    const later = significant(maximum.stress, 4)
    return isAstm
      ? `the upper yield point, ${upper} MPa, is the highest stress and is reported as tensile strength; after it the stress reaches ${later} MPa`
      : `the stress after yielding, ${later} MPa, stays below the upper yield point, ${upper} MPa: Rm is the later maximum; agree on it with the customer`
  }
  return isAstm
    ? `nothing hardens after the upper yield point, ${upper} MPa, which is reported as tensile strength`
    : `nothing hardens after the upper yield point, ${upper} MPa: ISO 6892-1 defines no Rm here; agree on it with the customer`
}

/** Scatter, curvature and steepness that a remark should explain. Shares of the slope, and MPa. */
const MOST_SCATTER = 0.01
const MOST_BEND = 0.1
const FEW_POINTS = 8
const STEEPNESS = { least: 5_000, most: 700_000 }

function doubts(line: ElasticLine): string[] {
  const found: string[] = []
  if (line.points < FEW_POINTS) found.push(`the elastic line rests on ${line.points} points only`)
  if (line.rSquared < 0.99 || line.slopeDeviation > MOST_SCATTER * line.slope) {
    found.push(`the points scatter about the elastic line: r² ${line.rSquared.toFixed(4)}, slope good to ${significant((100 * line.slopeDeviation) / line.slope, 2)} %`)
  }
  const { lower, upper } = line
  if (lower && upper) {
    const bend = upper.slope - lower.slope
    if (Math.abs(bend) > Math.max(MOST_BEND * line.slope, 3 * Math.hypot(lower.slopeDeviation, upper.slopeDeviation))) {
      found.push(`the elastic part is bent: its halves have slopes of ${significant(lower.slope, 3)} and ${significant(upper.slope, 3)} MPa`)
    }
  }
  if (line.slope < STEEPNESS.least || line.slope > STEEPNESS.most) found.push(`a slope of ${significant(line.slope, 3)} MPa fits no metal: look at units, gauge length and extensometer`)
  return found
}
