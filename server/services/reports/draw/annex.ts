import type { ReportContent } from '../../../../shared/reports/content.ts'
import { dayWords } from '../../../../shared/reports/words/day-words.ts'
import { numberIn, unitIn } from '../../../../shared/reports/words/number-in.ts'
import { amber, mm, page, quiet, width } from './ink.ts'
import { baseline, symbolSpans, type Paper } from './paper.ts'
import { code, shortNumber, written } from './results.ts'
import { drawTable, type Cell, type Row } from './table.ts'

const plain = (text: string, color?: string): Cell => ({ spans: [{ text, size: 8.5, ...(color && { color }) }] })
const name = (text: string): Cell => ({ spans: [{ text, face: 'medium', size: 8.5 }] })
const tight = { pad: mm(0.7), leading: 10.75, spread: mm(16) }

/** Each sample with what is known of it, where they are not alike. */
export function drawSamples(paper: Paper, { samples, site }: ReportContent): void {
  const kinds = new Set(samples.map(({ material, size, condition }) => JSON.stringify([material, size, condition])))
  if (kinds.size < 2 && samples.filter(({ remarks }) => remarks.length > 0).length <= 3) return
  const section = paper.section()
  paper.heading(section, 'Samples')
  drawTable(paper, section, {
    ...tight, columns: [{ align: 'left' }, { align: 'left', most: mm(22) }, { align: 'left', most: mm(22) }, { align: 'left', most: mm(40) }, { align: 'left', most: mm(30) }, { align: 'left', most: mm(45) }, { align: 'left' }],
    head: [{ cells: ['Sample', 'Heat', 'Lot', 'Material', 'Size, mm', 'Condition', 'Received'].map(name) }],
    body: samples.map(({ number, heat, lot, material, size, condition, receivedAt, remarks }) => ({
      cells: [code(shortNumber(number)), code(heat), code(lot), plain(material), plain(size), plain([condition || (receivedAt ? 'nothing unusual' : ''), ...remarks].filter(Boolean).join('; ')), plain(receivedAt ? dayWords(receivedAt, site.timeZone) : 'not received')],
    })),
  })
  paper.y += mm(5)
}

/** What the tests gave besides the main table. */
export function drawFurther(paper: Paper, { further }: ReportContent): void {
  if (further.length === 0) return
  const section = paper.section()
  for (const { label, columns, rows } of further) {
    paper.heading(section, `Further results: ${label}`)
    drawTable(paper, section, {
      ...tight, columns: [{ align: 'left' }, ...columns.map(() => ({ align: 'right' as const, most: mm(30) }))],
      head: [
        { cells: [name('Sample'), ...columns.map((column): Cell => plain(column.name, quiet))] },
        { cells: [plain(''), ...columns.map(({ symbol, unit }): Cell => ({ spans: [...symbolSpans(symbol), ...(unit ? [{ text: `, ${written(unit)}`, size: 8.5, color: quiet }] : [])] }))] },
      ],
      body: rows.map(({ sample, cells }) => ({ cells: [code(shortNumber(sample)), ...cells.map((text) => plain(text.replace('-', '−') || 'no result', text ? undefined : quiet))] })),
    })
    paper.y += mm(5)
  }
}

/** Converted values, apart from results and marked as what they are. */
export function drawConversions(paper: Paper, { conversions }: ReportContent): void {
  if (conversions.length === 0) return
  const section = paper.section()
  paper.heading(section, 'Approximate: converted by published tables', mm(35))
  const groups = new Map<string, ReportContent['conversions']>()
  for (const one of conversions) {
    const key = JSON.stringify([one.table, one.values.map(({ scale }) => scale)])
    groups.set(key, [...(groups.get(key) ?? []), one])
  }
  for (const group of groups.values()) {
    const first = group[0]!
    note(paper, section, `${first.table}. ${first.caution}`)
    drawTable(paper, section, {
      ...tight, columns: [{ align: 'left' }, { align: 'right' }, ...first.values.map(() => ({ align: 'right' as const, most: mm(24) }))],
      head: [{ cells: [name('Sample'), name('Measured'), ...first.values.map(({ scale, reported }) => name(unitIn(reported) || scale))] }],
      body: group.map(({ sample, of, values }) => ({ cells: [code(shortNumber(sample)), plain(of), ...values.map(({ reported, informative }) => plain(informative ? `(≈ ${numberIn(reported)})` : `≈ ${numberIn(reported)}`))] })),
    })
    if (group.some(({ values }) => values.some(({ informative }) => informative))) paper.paragraph(section, [{ text: 'In brackets: values that the table gives for information only.', size: 8, color: quiet }], { leading: 11 })
    paper.y += mm(5)
  }
}

/** A caution: its sign, a bar beside it, and the words. */
function note(paper: Paper, section: ReturnType<Paper['section']>, text: string): void {
  const { doc } = paper
  const lines = paper.wrap([{ text, size: 8.5, color: amber }], width - mm(9))
  paper.need(lines.length * 11.5 + mm(25))
  const top = paper.y
  paper.decor(() => {
    doc.rect(page.left, top, 2.25, lines.length * 11.5).fill(amber)
    doc.polygon([page.left + 13, top + 1.2], [page.left + 18, top + 9.8], [page.left + 8, top + 9.8]).lineWidth(0.9).strokeColor(amber).stroke()
    doc.moveTo(page.left + 13, top + 4).lineTo(page.left + 13, top + 7).stroke()
    doc.circle(page.left + 13, top + 8.4, 0.5).fill(amber)
  })
  paper.tag(section, 'Note', () => { for (const [at, { spans }] of lines.entries()) paper.put(spans, page.left + mm(9), baseline(top + at * 11.5, 11.5, 8.5)) })
  paper.y = top + lines.length * 11.5 + mm(2.5)
}

/** Every reading that counts, by test and sample. */
export function drawReadings(paper: Paper, { readings }: ReportContent): void {
  const labels = [...new Set(readings.map(({ label }) => label))]
  const section = paper.section()
  for (const label of labels) {
    const own = readings.filter((one) => one.label === label && (one.rows.length > 0 || one.notes.length > 0))
    const shapes = [...new Set(own.map(({ columns }) => JSON.stringify(columns)))]
    for (const shape of shapes) {
      const columns = JSON.parse(shape) as string[]
      const group = own.filter((one) => JSON.stringify(one.columns) === shape)
      paper.heading(section, `Single readings: ${label}`)
      drawTable(paper, section, columns.length === 1 ? listOf(columns, group) : blocksOf(columns, group))
      paper.y += mm(5)
    }
  }
}

type Group = ReportContent['readings']

/** One value a reading: all readings of a sample in one row. */
function listOf(columns: readonly string[], group: Group) {
  return {
    ...tight, spread: 0, gap: mm(5), columns: [{ align: 'left' as const }, { align: 'left' as const, most: mm(150) }], head: [{ cells: [name('Sample'), name(columns[0]!)] }],
    body: group.flatMap(({ sample, rows, notes }) => [
      { cells: [code(shortNumber(sample)), { spans: [{ text: rows.map(([value]) => value).join('   '), face: 'mono' as const, size: 8.5 }] }], ...(notes.length > 0 && { ruleBelow: null }) },
      ...noteRows(notes, 2),
    ]),
  }
}

/** Several values a reading: a row for each. */
function blocksOf(columns: readonly string[], group: Group) {
  const numbered = group.some(({ rows }) => rows.length > 1)
  return {
    ...tight, columns: [{ align: 'left' as const }, ...(numbered ? [{ align: 'right' as const }] : []), ...columns.map(() => ({ align: 'right' as const, most: mm(32) }))],
    head: [{ cells: [name('Sample'), ...(numbered ? [name('No.')] : []), ...columns.map(name)] }],
    body: group.flatMap(({ sample, rows, notes }) => [
      ...rows.map((row, at): Row => ({
        cells: [at === 0 ? code(shortNumber(sample)) : plain(''), ...(numbered ? [plain(String(at + 1), quiet)] : []), ...row.map((text): Cell => ({ spans: [{ text, face: /^[\d.,−\- ]*$/.test(text) ? 'mono' : 'regular', size: 8.5 }] }))],
        ...((at < rows.length - 1 || notes.length > 0) && { ruleBelow: null }),
      })),
      ...noteRows(notes, columns.length + (numbered ? 2 : 1)),
    ]),
  }
}

function noteRows(notes: readonly string[], columns: number): Row[] {
  return notes.map((text, at) => ({ cells: [plain(''), { span: columns - 1, align: 'left', spans: [{ text, size: 8.25, color: quiet }] }], ...(at < notes.length - 1 && { ruleBelow: null }) }))
}
