import type { Check } from '../method/method.ts'
import { significant } from '../units/significant.ts'
import type { FieldConfidence } from './field-confidence.ts'

const FEWEST_FIELDS = 3
const FEWEST_COUNTS = 50
/** Relative accuracy that ASTM E112 takes as good enough for most purposes, %. */
const USUAL_ACCURACY = 10

/** The rules of the count that a set of fields breaks. `counts` are per field, in order. */
export function grainInterceptChecks(counts: readonly number[], confidence: FieldConfidence | undefined): Check[] {
  const checks: Check[] = []
  const total = counts.reduce((sum, count) => sum + count, 0)
  if (counts.length < FEWEST_FIELDS) {
    checks.push({ code: 'too-few-fields', severity: 'error', message: `${counts.length} of at least ${FEWEST_FIELDS} fields` })
  }
  if (total < FEWEST_COUNTS) {
    checks.push({ code: 'too-few-counts', severity: 'error', message: `${total} counts in all: at least ${FEWEST_COUNTS} are needed` })
  }
  counts.forEach((count, reading) => {
    if (!Number.isInteger(count * 2)) checks.push({ code: 'count-in-halves', severity: 'warning', reading, message: `field ${reading + 1} counts ${count}: counts are whole or half numbers` })
  })
  if (confidence && confidence.relativeAccuracy > USUAL_ACCURACY) {
    checks.push({
      code: 'relative-accuracy', severity: 'warning',
      message: `the relative accuracy is ${significant(confidence.relativeAccuracy, 3)} %: ${USUAL_ACCURACY} % or better is usual, more fields bring it down`,
    })
  }
  return checks
}
