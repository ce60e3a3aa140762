import type { ReportContent } from './content.ts'

/** What a revision says differently from the one before, in words; empty when it would say the same (ISO/IEC 17025:2017, 7.8.8). */
export function changesBetween(earlier: ReportContent, now: ReportContent): string[] {
  const same = (one: unknown, other: unknown) => sorted(one) === sorted(other)
  const whole = (what: string, pick: (content: ReportContent) => unknown) => (same(pick(earlier), pick(now)) ? [] : [what])
  return [
    ...whole('the laboratory\'s name or address', ({ company, site }) => [company, site]),
    ...whole('the customer\'s name or address', ({ customer }) => customer),
    ...whole('the order number', ({ purchaseOrder }) => purchaseOrder),
    ...sampleChanges(earlier, now),
    ...resultChanges(earlier, now),
    ...whole('how it was tested', ({ methods }) => methods),
    ...whole('limits or the statement of conformity', ({ conformity, limits }) => [conformity, limits]),
    ...whole('single readings', ({ readings }) => readings),
    ...whole('what else the tests gave', ({ further, conversions, pictures }) => [further, conversions, pictures]),
    ...whole('deviations and remarks', ({ deviations }) => deviations),
    ...whole('statements', ({ statements }) => statements),
  ]
}

function sampleChanges(earlier: ReportContent, now: ReportContent): string[] {
  const before = new Map(earlier.samples.map((sample) => [sample.number, sample]))
  return now.samples.flatMap((sample) => {
    const old = before.get(sample.number)
    if (!old) return [`sample ${sample.number} was added`]
    const fields = (['heat', 'lot', 'material', 'size', 'condition'] as const).filter((field) => old[field] !== sample[field])
    return fields.map((field) => `${field} of sample ${sample.number}: ${sample[field] || 'none'}, was ${old[field] || 'none'}`)
  })
}

function resultChanges(earlier: ReportContent, now: ReportContent): string[] {
  const before = new Map(earlier.rows.map(({ sample, cells }) => [sample, cells]))
  return now.rows.flatMap(({ sample, cells }) => now.columns.flatMap(({ key, symbol }) => {
    const [old, own] = [before.get(sample)?.[key]?.reported, cells[key]?.reported]
    return old === own ? [] : [`${symbol} of sample ${sample}: ${own ?? 'none'}, was ${old ?? 'none'}`]
  }))
}

/** As text in which the order of keys does not matter: the database keeps its own. */
function sorted(value: unknown): string {
  return JSON.stringify(value, (_key, one: unknown) => (typeof one === 'object' && one !== null && !Array.isArray(one) ? Object.fromEntries(Object.entries(one).sort(([a], [b]) => (a < b ? -1 : 1))) : one))
}
