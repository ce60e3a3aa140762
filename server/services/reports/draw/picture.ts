import { scaleLinear } from 'd3-scale'
import type { ReportContent } from '../../../../shared/reports/content.ts'
import { edge, hairline, ink, mm, page, quiet, width } from './ink.ts'
import { baseline, symbolSpans, type Paper } from './paper.ts'
import { written } from './results.ts'

type Drawn = ReportContent['pictures'][number]
const gap = mm(8)
const figureWidth = (width - gap) / 2
const plotHeight = mm(40)
const figureHeight = plotHeight + mm(9)

/** Pictures, two beside each other. */
export function drawPictures(paper: Paper, pictures: readonly Drawn[]): void {
  const section = paper.section()
  for (let at = 0; at < pictures.length; at += 2) {
    paper.need(figureHeight)
    const top = paper.y
    for (const [side, picture] of pictures.slice(at, at + 2).entries()) drawFigure(paper, picture, page.left + side * (figureWidth + gap), top, section)
    paper.y = top + figureHeight + mm(3)
  }
}

function drawFigure(paper: Paper, { sample, picture }: Drawn, left: number, top: number, section: ReturnType<Paper['section']>): void {
  const { doc } = paper
  const points = picture.lines.flatMap(({ points: own }) => own)
  const curve = picture.lines.filter(({ kind }) => kind === 'curve').flatMap(({ points: own }) => own)
  const seen = curve.length > 0 ? curve : points
  const extent = (values: number[]) => [Math.min(0, ...values), Math.max(...values)] as const
  const [x0, x1] = extent([...seen.map(([x]) => x), ...picture.marks.map(({ x }) => x)])
  const [y0, y1] = extent([...seen.map(([, y]) => y), ...picture.marks.map(({ y }) => y)])
  const plot = { left: left + mm(9), right: left + figureWidth - mm(1), top: top + mm(1), bottom: top + plotHeight - mm(4.5) }
  const x = scaleLinear([x0, x1 + (x1 - x0) * 0.04 || 1], [plot.left, plot.right])
  // room above the highest point for its label
  const y = scaleLinear([y0, y1 + (y1 - y0) * 0.14 || 1], [plot.bottom, plot.top])
  const where = (unit: string) => (unit ? ` in ${written(unit)}` : '')
  const caption = `Sample ${sample.split('-').at(-1)}, ${picture.title.charAt(0).toLowerCase()}${picture.title.slice(1)}: ${picture.y.label}${where(picture.y.unit)} against ${picture.x.label}${where(picture.x.unit)}`
  const alt = `${caption}. ${picture.marks.map(({ label, x: mx, y: my }) => `${label} at ${short(mx)} and ${short(my)}`).join(', ')}`
  paper.tag(section, 'Figure', () => {
    for (const tick of y.ticks(4)) {
      paper.rule(y(tick), hairline, plot.left, plot.right, 0.5)
      paper.put([{ text: minus(y.tickFormat(4)(tick)), size: 7.5, color: quiet }], left, y(tick) + 2.6, { align: 'right', within: plot.left - left - 4 })
    }
    for (const tick of x.ticks(5)) {
      doc.moveTo(x(tick), plot.bottom).lineTo(x(tick), plot.bottom + 2.5).lineWidth(0.5).strokeColor(edge).stroke()
      paper.put([{ text: minus(x.tickFormat(5)(tick)), size: 7.5, color: quiet }], x(tick) - 20, plot.bottom + 10, { align: 'center', within: 40 })
    }
    paper.rule(y(y0), edge, plot.left, plot.right, 0.75)
    doc.save().rect(plot.left, plot.top - 3, plot.right - plot.left, plot.bottom - plot.top + 3).clip()
    for (const { kind, points: own } of [...picture.lines].sort((a, b) => Number(a.kind === 'curve') - Number(b.kind === 'curve'))) {
      if (own.length < 2) continue
      own.forEach(([px, py], at) => (at === 0 ? doc.moveTo(x(px), y(py)) : doc.lineTo(x(px), y(py))))
      if (kind === 'dashed') doc.dash(2.5, { space: 2 })
      doc.lineWidth(kind === 'curve' ? 1.1 : 0.6).lineJoin('round').strokeColor(kind === 'curve' ? ink : edge).stroke()
      if (kind === 'dashed') doc.undash()
    }
    doc.restore()
    drawMarks(paper, picture.marks.map((mark) => ({ ...mark, px: x(mark.x), py: y(mark.y) })), plot)
  }, { alt, bbox: [left, top, left + figureWidth, top + plotHeight] } as Parameters<Paper['tag']>[3])
  paper.tag(section, 'Caption', () => {
    for (const [at, { spans }] of paper.wrap([{ text: caption, size: 8, color: quiet }], figureWidth).entries()) paper.put(spans, left, baseline(top + plotHeight + mm(0.5) + at * 11, 11, 8))
  })
}

/** Rings with their labels: right below the point, or above it near the top, and never over an earlier label. */
function drawMarks(paper: Paper, marks: readonly { label: string; px: number; py: number }[], plot: { left: number; right: number; top: number; bottom: number }): void {
  const taken: { x: number; y: number; w: number }[] = []
  for (const { label, px, py } of marks) {
    paper.doc.circle(px, py, 2.2).lineWidth(1).fillAndStroke('#FFFFFF', ink)
    const spans = label.split(' ').flatMap((word, at) => [...(at > 0 ? [{ text: ' ', face: 'medium' as const, size: 7.75 }] : []), ...symbolSpans(word, { size: 7.75 })])
    const w = paper.widthOf(spans)
    const places = [
      ...(py < plot.top + (plot.bottom - plot.top) * 0.25 ? [{ x: px - w / 2, y: py - 5 }] : []), { x: px + 5, y: py + 9 }, { x: px + 5, y: py + 19 }, { x: px - w - 5, y: py - 4 }, { x: px + 5, y: py + 29 }, { x: px - w - 5, y: py + 9 },
    ].map((place) => ({ ...place, x: Math.min(Math.max(place.x, plot.left + 2), plot.right - w) }))
    const free = places.find((place) => place.y < plot.bottom - 2 && taken.every((other) => Math.abs(other.y - place.y) > 9 || place.x > other.x + other.w || place.x + w < other.x)) ?? places[0]!
    taken.push({ ...free, w })
    paper.put(spans, free.x, free.y)
  }
}

const minus = (text: string) => text.replace('-', '−')
const short = (value: number) => String(Number(value.toPrecision(4)))
