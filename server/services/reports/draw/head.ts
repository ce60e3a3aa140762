import type { ReportContent } from '../../../../shared/reports/content.ts'
import { dayRange, dayWords } from '../../../../shared/reports/words/day-words.ts'
import { ink, mm, page, quiet, temper, width } from './ink.ts'
import { baseline, type Element, type Paper, type Span } from './paper.ts'

/** The letterhead: laboratory, title and number, the way of the job as a line, and what the report is about. */
export function drawHead(paper: Paper, content: ReportContent): void {
  const section = paper.section()
  drawLetterhead(paper, section, content)
  drawWay(paper, section, content)
  drawFacts(paper, section, content)
}

function drawLetterhead(paper: Paper, section: Element, { company, title, number, revision, supersedes }: ReportContent): void {
  const top = paper.y
  const lines = [company.address, company.email].flatMap((text) => paper.wrap([{ text, size: 8.25, color: quiet }], mm(95)))
  const height = Math.max(37, 15 + lines.length * 11)
  const left = top + height - 15 - lines.length * 11
  paper.tag(section, 'P', () => {
    paper.put([{ text: company.name, face: 'bold', size: 12 }], page.left, baseline(left, 15, 12))
    for (const [at, { spans }] of lines.entries()) paper.put(spans, page.left, baseline(left + 15 + at * 11, 11, 8.25))
  })
  const right = { align: 'right', within: width } as const
  paper.tag(section, 'H1', () => {
    paper.put([{ text: title, face: 'medium', size: 20 }], page.left, baseline(top + height - 37, 23, 20), right)
    paper.put([{ text: `${number}/${revision}`, face: 'mono medium', size: 11 }], page.left, baseline(top + height - 14, 14, 11), right)
  })
  paper.y = top + height
  if (supersedes) {
    paper.paragraph(section, [{ text: `Replaces ${supersedes.number}. `, face: 'medium', size: 8.5 }, { text: `Changed: ${supersedes.changes.join('; ')}.`, size: 8.5 }], { after: 0 })
  }
  paper.y += mm(5)
}

/** The traveller line: what was done when, each part in the temper colour of its stage. */
function drawWay(paper: Paper, section: Element, { dates, site }: ReportContent): void {
  const zone = site.timeZone
  const nodes = [
    { kind: 'end', tone: temper.straw, label: 'placed', when: dayWords(dates.placed, zone) },
    { kind: 'prep', tone: temper.gold, label: 'received', when: dates.received ? dayRange(dates.received, zone) : 'not noted' },
    { kind: 'test', tone: temper.bronze, label: 'tested', when: dayRange(dates.tested, zone) },
    { kind: 'review', tone: temper.purple, label: 'reviewed', when: dayRange(dates.reviewed, zone) },
    { kind: 'report', tone: temper.blue, label: 'reported', when: dayWords(dates.issued, zone) },
  ] as const
  const { doc, y } = paper
  const step = (width - 50) / (nodes.length - 1)
  const middle = y + 9
  paper.decor(() => {
    for (const [at, { tone }] of nodes.entries()) if (at > 0) doc.rect(page.left + (at - 1) * step, middle - 1.7, step, 3.4).lineWidth(0.75).fillAndStroke(tone[0], tone[1])
    for (const [at, node] of nodes.entries()) drawNode(paper, node.kind, node.tone, page.left + at * step, middle)
  })
  const list = doc.struct('L')
  section.add(list)
  for (const [at, { label, when }] of nodes.entries()) {
    paper.tag(list, 'LI', () => {
      paper.put([{ text: label, size: 8.75 }], page.left + at * step, baseline(y + 19, 11, 8.75))
      paper.put([{ text: when, size: 8, color: quiet }], page.left + at * step, baseline(y + 30, 10.5, 8))
    })
  }
  paper.y = y + 40.5 + mm(4.5)
}

/** The shape of a node is its kind: an end, hands on the sample, a number read, a review, a report. */
function drawNode({ doc }: Paper, kind: 'end' | 'prep' | 'test' | 'review' | 'report', [fill, edge]: readonly [string, string], x: number, middle: number): void {
  doc.save().lineWidth(1)
  if (kind === 'end') doc.rect(x + 0.5, middle - 7.3, 4, 14.6)
  if (kind === 'prep') doc.rect(x + 0.5, middle - 5, 10, 10)
  if (kind === 'test') doc.circle(x + 5.5, middle, 5)
  if (kind === 'review') doc.polygon([x + 6, middle - 6], [x + 12, middle], [x + 6, middle + 6], [x, middle])
  if (kind === 'report') doc.path(`M ${x + 0.5} ${middle - 6.2} h 4.6 a 4.2 4.2 0 0 1 4.2 4.2 v 8.4 h -8.8 z`)
  doc.fillAndStroke(fill, edge).restore()
}

type Fact = [string, Span[]]

function drawFacts(paper: Paper, section: Element, { customer, purchaseOrder, jobNumber, samples, site }: ReportContent): void {
  const left: Fact[] = [
    ['Customer', [{ text: `${customer.name}\n${customer.address}` }]],
    ['Order no.', [{ text: purchaseOrder || 'none given' }]],
    ['Job', [{ text: jobNumber, face: 'mono', size: 8.75 }]],
  ]
  const right: Fact[] = [
    ['Material', [{ text: materialWords(samples) }]],
    ['Samples', [{ text: sampleWords(samples) }]],
    ['Place', [{ text: site.address.includes(site.name) ? site.address : `${site.name}, ${site.address}` }]],
  ]
  const gap = mm(8)
  const leftWidth = (width - gap) / 2.55
  const top = paper.y
  const ends = [drawList(paper, section, left, page.left, leftWidth, top), drawList(paper, section, right, page.left + leftWidth + gap, width - gap - leftWidth, top)]
  paper.y = Math.max(...ends) + mm(5)
}

/** A list of names and values; gives where it ends. */
function drawList(paper: Paper, section: Element, facts: readonly Fact[], x: number, within: number, top: number): number {
  let y = top
  for (const [name, spans] of facts) {
    const lines = paper.wrap(spans, within - mm(20))
    paper.tag(section, 'P', () => {
      paper.put([{ text: name, color: quiet }], x, baseline(y, 12.5))
      for (const [at, line] of lines.entries()) paper.put(line.spans.map((span) => ({ color: ink, ...span })), x + mm(20), baseline(y + at * 12.5, 12.5))
    })
    y += lines.length * 12.5 + 2.25
  }
  return y
}

function materialWords(samples: ReportContent['samples']): string {
  const kinds = [...new Set(samples.map(({ material, size }) => [material, size].filter(Boolean).join(', ')))]
  return kinds.length === 1 ? `${kinds[0]}, as stated by the customer` : `${kinds.length} kinds, listed under Samples, as stated by the customer`
}

function sampleWords(samples: ReportContent['samples']): string {
  const conditions = [...new Set(samples.map(({ receivedAt, condition }) => (receivedAt ? condition || 'nothing unusual was noted' : 'not received')))]
  const remarks = samples.flatMap(({ number, remarks: own }) => own.map((remark) => `${number.split('-').at(-1)}: ${remark}`))
  return [`${samples.length}, ${conditions.length === 1 ? `as received: ${conditions[0]}` : 'condition of each under Samples'}`, ...remarks.slice(0, 3), ...(remarks.length > 3 ? ['more under Samples'] : [])].join('; ')
}
