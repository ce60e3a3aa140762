import type { ReportContent } from '../../../../shared/reports/content.ts'
import { mm, red } from './ink.ts'
import type { Paper, Span } from './paper.ts'

/** Most results that are named one by one; all are marked in the table. */
const most = 12

/** Conformity with its decision rule, deviations, and what every report has to say. */
export function drawWords(paper: Paper, { conformity, deviations, statements }: ReportContent): void {
  const section = paper.section()
  const set = (spans: Span[], after: number) => paper.paragraph(section, spans.map((span) => ({ size: 8.5, ...span })), { after })
  const say = (...spans: Span[]) => set(spans, mm(1.5))
  /** Lines that belong together. */
  const list = (texts: readonly string[]) => texts.forEach((text, at) => set([{ text }], at === texts.length - 1 ? mm(1.5) : 0))
  if (conformity) {
    say({ text: 'Conformity. ', face: 'bold' }, { text: `${conformity.statement} `, ...(conformity.outcome === 'fail' && { face: 'bold', color: red }) }, { text: conformity.rule })
    list(conformity.findings.slice(0, most))
    if (conformity.findings.length > most) say({ text: `${conformity.findings.length - most} more are marked in the table of results.` })
    for (const text of conformity.limits) say({ text: 'Limits. ', face: 'bold' }, { text: `${text}.` })
  }
  say({ text: 'Deviations. ', face: 'bold' }, { text: deviations.length === 0 ? 'No additions to, deviations or exclusions from the methods.' : deviations.length === 1 ? deviations[0]! : `${deviations.length}, as follows.` })
  if (deviations.length > 1) list(deviations)
  for (const text of statements) say({ text })
}
