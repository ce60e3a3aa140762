import type { ReportContent } from '../../../../shared/reports/content.ts'
import { mm, red } from './ink.ts'
import type { Paper, Span } from './paper.ts'

const most = 40

/** Conformity with its decision rule, deviations, and what every report has to say. */
export function drawWords(paper: Paper, { conformity, deviations, statements }: ReportContent): void {
  const section = paper.section()
  const say = (...spans: Span[]) => paper.paragraph(section, spans.map((span) => ({ size: 8.5, ...span })), { after: mm(1.5) })
  if (conformity) {
    say({ text: 'Conformity. ', face: 'bold' }, { text: `${conformity.statement} `, ...(conformity.outcome === 'fail' && { face: 'bold', color: red }) }, { text: conformity.rule })
    for (const text of conformity.findings.slice(0, most)) say({ text })
    if (conformity.findings.length > most) say({ text: `${conformity.findings.length - most} more are marked in the table of results.` })
    for (const text of conformity.limits) say({ text: 'Limits. ', face: 'bold' }, { text: `${text}.` })
  }
  say({ text: 'Deviations. ', face: 'bold' }, { text: deviations.length === 0 ? 'No additions to, deviations or exclusions from the methods.' : deviations.length === 1 ? deviations[0]! : `${deviations.length}, as follows.` })
  if (deviations.length > 1) for (const text of deviations) say({ text })
  for (const text of statements) say({ text })
}
