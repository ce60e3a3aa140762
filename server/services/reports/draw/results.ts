import type { ReportContent } from '../../../../shared/reports/content.ts'
import { ink, mm, quiet, red, width } from './ink.ts'
import { symbolSpans, type Element, type Paper, type Span } from './paper.ts'
import { drawTable, wantedWidths, type Cell, type Row, type TableOf } from './table.ts'

type Part = ReportContent['columns']
const verdictInset = mm(3)
const verdicts = { pass: 'met', fail: 'not met', undecided: 'undecided' } as const

/** The results table. Columns that do not fit beside each other go into further tables under the first, each with its samples. */
export function drawResults(paper: Paper, content: ReportContent): void {
  const section = paper.section()
  paper.heading(section, 'Results', mm(24))
  const parts = partsOf(paper, content)
  for (const [at, columns] of parts.entries()) {
    if (at > 0) paper.y += mm(4)
    drawTable(paper, section, tableOf(content, columns, { isFirst: at === 0, isLast: at === parts.length - 1 }))
  }
  paper.y += mm(3.5)
}

function partsOf(paper: Paper, content: ReportContent): Part[] {
  const parts: Part[] = []
  let left = [...content.columns]
  while (left.length > 0) {
    let take = left.length
    const fits = () => wantedWidths(paper, tableOf(content, left.slice(0, take), { isFirst: parts.length === 0, isLast: take === left.length })).reduce((sum, one) => sum + one, 0) <= width
    while (take > 1 && !fits()) take -= 1
    parts.push(left.slice(0, take))
    left = left.slice(take)
  }
  return parts
}

function tableOf(content: ReportContent, results: Part, { isFirst, isLast }: { isFirst: boolean; isLast: boolean }): TableOf {
  const { samples, rows, limits, uncertainties, coverage } = content
  const has = { heat: isFirst && samples.some(({ heat }) => heat), lot: isFirst && samples.some(({ lot }) => lot), verdict: isLast && rows.some(({ outcome }) => outcome) }
  const before = 1 + Number(has.heat) + Number(has.lot)
  const after: Cell[] = has.verdict ? [{ spans: [] }] : []
  const label = (text: string, color: string): Cell => ({ span: before, align: 'left', spans: [{ text, size: 8.25, color }] })
  const foot: Row[] = []
  if (results.some(({ key }) => limits[key])) foot.push({ cells: [label('Requirement, as ordered', ink), ...results.map(({ key }) => small(limits[key] ?? '', ink)), ...after] })
  if (results.some(({ key }) => uncertainties[key])) foot.push({ cells: [label(`${coverage.startsWith('k') ? 'Expanded uncertainty' : 'Expanded U'}, ${coverage}`, quiet), ...results.map(({ key }) => small(uncertainties[key] ?? '', quiet)), ...after] })
  return {
    columns: [
      { align: 'left' }, ...(has.heat ? [{ align: 'left' as const, most: mm(26) }] : []), ...(has.lot ? [{ align: 'left' as const, most: mm(26) }] : []),
      ...results.map(() => ({ align: 'right' as const, most: mm(24) })), ...(has.verdict ? [{ align: 'left' as const }] : []),
    ],
    head: headOf(results, has, before), foot,
    body: rows.map(({ sample, outcome, cells, missing }, at): Row => ({
      ruleBelow: at === rows.length - 1 && foot.length > 0 ? ink : undefined,
      cells: [
        code(shortNumber(sample)), ...(has.heat ? [code(samples[at]?.heat ?? '')] : []), ...(has.lot ? [code(samples[at]?.lot ?? '')] : []),
        ...results.map(({ key }) => resultCell(cells[key], missing[key] ?? '')), ...(has.verdict ? [verdictCell(outcome)] : []),
      ],
    })),
  }
}

function headOf(results: Part, has: { heat: boolean; lot: boolean; verdict: boolean }, before: number): Row[] {
  const name = (text: string): Cell => ({ spans: [{ text, face: 'medium', size: 8.5 }] })
  const empty: Cell = { spans: [] }
  const heads = results.map(({ head, unit }) => `${head} ${unit}`)
  const repeats = new Set(heads).size < heads.length
  const groups = results.reduce<{ group: string; span: number }[]>((all, { group }) => {
    const last = all.at(-1)
    if (last?.group === group) last.span += 1
    else all.push({ group, span: 1 })
    return all
  }, [])
  return [
    ...(repeats ? [{ cells: [...Array.from({ length: before }, () => empty), ...groups.map(({ group, span }): Cell => ({ span, align: 'right', spans: [{ text: group, size: 8, color: quiet }] })), ...(has.verdict ? [empty] : [])] }] : []),
    { cells: [name('Sample'), ...(has.heat ? [name('Heat')] : []), ...(has.lot ? [name('Lot')] : []), ...results.map(({ head, symbol }): Cell => ({ spans: head === symbol ? symbolSpans(head) : [{ text: head, face: 'medium', size: 8.5 }] })), ...(has.verdict ? [{ ...name('Requirement'), inset: verdictInset }] : [])] },
    { cells: [...Array.from({ length: before }, () => empty), ...results.map(({ unit, head }): Cell => ({ spans: unit === head ? [] : [{ text: written(unit), size: 8.5, color: quiet }] })), ...(has.verdict ? [empty] : [])] },
  ]
}

function resultCell(cell: ReportContent['rows'][number]['cells'][string] | undefined, missing: string): Cell {
  if (!cell) return { spans: [{ text: missing, size: 7.75, color: quiet }] }
  const span: Span = { text: cell.number.replace('-', '−') }
  return { spans: [cell.outcome === 'fail' ? { ...span, face: 'bold', color: red } : span] }
}

function verdictCell(outcome: keyof typeof verdicts | null): Cell {
  if (!outcome) return { inset: verdictInset, spans: [{ text: 'none', size: 7.75, color: quiet }] }
  return { sign: outcome, inset: verdictInset, spans: [{ text: verdicts[outcome], ...(outcome === 'fail' && { face: 'bold' as const, color: red }) }] }
}

/** The last part of a sample's number; the job's number stands above. */
export const shortNumber = (sample: string) => `-${sample.split('-').at(-1)}`
export const code = (text: string): Cell => ({ spans: [{ text, face: 'mono', size: 8.75 }] })
const small = (text: string, color: string): Cell => ({ spans: [{ text, size: 8.25, color }] })

/** Units as they are printed. */
export function written(unit: string): string {
  return unit === 'mm2' ? 'mm²' : unit
}

/** What was tested how, by whom and on what. */
export function drawMethods(paper: Paper, { methods, testers, reviewers }: ReportContent): void {
  const section = paper.section()
  const labelWidth = mm(26)
  const facts: [string, string][] = methods.map(({ label, lines, equipment }) => [label, `${lines.map(ended).join(' ')}${equipment.length > 0 ? ` Machine ${equipment.join(', ')}.` : ''}`])
  facts.push(['Carried out by', `${testers.join(', ')}; reviewed by ${reviewers.join(', ')}.`])
  paper.need(mm(14))
  for (const [label, text] of facts) drawFact(paper, section, label, text, labelWidth)
  paper.y += mm(3)
}

function drawFact(paper: Paper, section: Element, label: string, text: string, labelWidth: number): void {
  const names = paper.wrap([{ text: label, size: 8.5, color: quiet }], labelWidth - mm(3))
  const lines = paper.wrap([{ text, size: 8.5 }], width - labelWidth)
  const leading = 11.5
  paper.need(Math.min(lines.length, 4) * leading)
  const top = paper.y
  const left = paper.doc.page
  paper.tag(section, 'P', () => { for (const [at, { spans }] of names.entries()) paper.put(spans, mm(18), top + at * leading + 8.7) })
  paper.paragraph(section, [{ text, size: 8.5 }], { x: mm(18) + labelWidth, within: width - labelWidth, leading })
  if (paper.doc.page === left) paper.y = Math.max(paper.y, top + names.length * leading)
  paper.y += 1
}

const ended = (text: string) => (/[.!?]$/.test(text) ? text : `${text}.`)
