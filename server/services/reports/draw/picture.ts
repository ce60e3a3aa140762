import { scaleLinear } from 'd3-scale'
import type { ReportContent } from '../../../../shared/reports/content.ts'
import { edge, hairline, ink, mm, page, quiet, wash, width } from './ink.ts'
import { baseline, symbolSpans, type Element, type Paper } from './paper.ts'
import { clearPlace, type Spot } from './clear-place.ts'
import { written } from './results.ts'

type Drawn = ReportContent['pictures'][number]
type Size = { across: number; gap: number; plot: number; label: number }
/** Two beside each other; where there are many, three. */
const large: Size = { across: 2, gap: mm(8), plot: mm(36), label: 7.75 }
const small: Size = { across: 3, gap: mm(6), plot: mm(31), label: 7 }
const fewest = 9
const captionHeight = mm(8.5)

/** Pictures of runs, side by side. */
export function drawPictures(paper: Paper, pictures: readonly Drawn[]): void {
  const section = paper.section()
  const size = pictures.length < fewest ? large : small
  const own = (width - size.gap * (size.across - 1)) / size.across
  for (let at = 0; at < pictures.length; at += size.across) {
    paper.need(size.plot + captionHeight)
    const top = paper.y
    const ends = pictures.slice(at, at + size.across).map((picture, side) => drawFigure(paper, section, picture, { left: page.left + side * (own + size.gap), top, width: own, ...size }))
    paper.y = Math.max(...ends) + mm(2.5)
  }
}

/** Draws one picture with its caption; gives where it ends. */
function drawFigure(paper: Paper, section: Element, { sample, picture }: Drawn, { left, top, width: own, plot: height, label }: Size & { left: number; top: number; width: number }): number {
  const { doc } = paper
  const curve = picture.lines.filter(({ kind }) => kind === 'curve').flatMap(({ points }) => points)
  const seen = [...(curve.length > 0 ? curve : picture.lines.flatMap(({ points }) => points)), ...picture.marks.map(({ x, y }): [number, number] => [x, y])]
  const extent = (values: number[]) => [Math.min(0, ...values), Math.max(0, ...values)] as const
  const [x0, x1] = extent(seen.map(([x]) => x))
  const [y0, y1] = extent(seen.map(([, y]) => y))
  const plot = { left: left + mm(9), right: left + own - mm(1), top: top + mm(1), bottom: top + height - mm(4.5) }
  const x = scaleLinear([x0, x1 + (x1 - x0 || 1) * 0.04], [plot.left, plot.right])
  // room above the highest point for its label
  const y = scaleLinear([y0, y1 + (y1 - y0 || 1) * 0.16], [plot.bottom, plot.top])
  const caption = `Sample ${sample.split('-').at(-1)}, ${lower(picture.title)}: ${axis(picture.y)} against ${axis(picture.x)}`
  const alt = `${caption}. ${picture.marks.map((mark) => mark.label).join(', ')}`
  paper.tag(section, 'Figure', () => {
    if (picture.window) doc.rect(plot.left, y(picture.window.to), plot.right - plot.left, y(picture.window.from) - y(picture.window.to)).fill(wash)
    for (const tick of y.ticks(4)) {
      paper.rule(y(tick), hairline, plot.left, plot.right, 0.5)
      paper.put([{ text: plain(tick), size: 7.5, color: quiet }], left, y(tick) + 2.6, { align: 'right', within: plot.left - left - 4 })
    }
    for (const tick of x.ticks(5)) {
      doc.moveTo(x(tick), plot.bottom).lineTo(x(tick), plot.bottom + 2.5).lineWidth(0.5).strokeColor(edge).stroke()
      paper.put([{ text: plain(tick), size: 7.5, color: quiet }], x(tick) - 20, plot.bottom + 10, { align: 'center', within: 40 })
    }
    paper.rule(y(y0), edge, plot.left, plot.right, 0.75)
    doc.save().rect(plot.left, plot.top - 3, plot.right - plot.left, plot.bottom - plot.top + 3).clip()
    for (const { kind, points } of [...picture.lines].sort((a, b) => Number(a.kind === 'curve') - Number(b.kind === 'curve'))) {
      if (points.length < 2) continue
      points.forEach(([px, py], at) => (at === 0 ? doc.moveTo(x(px), y(py)) : doc.lineTo(x(px), y(py))))
      if (kind === 'dashed') doc.dash(2.5, { space: 2 })
      doc.lineWidth(kind === 'curve' ? 1.1 : 0.6).lineJoin('round').strokeColor(kind === 'curve' ? ink : edge).stroke()
      if (kind === 'dashed') doc.undash()
    }
    doc.restore()
    const drawn = picture.lines.map(({ points }) => points.map(([px, py]): Spot => ({ x: x(px), y: y(py) })))
    drawMarks(paper, picture.marks.map((mark) => ({ label: mark.label, x: x(mark.x), y: y(mark.y) })), drawn, plot, label)
  }, { alt, bbox: [left, top, left + own, top + height] })
  const lines = paper.wrap([{ text: caption, size: 7.75, color: quiet }], own)
  paper.tag(section, 'Caption', () => {
    for (const [at, { spans }] of lines.entries()) paper.put(spans, left, baseline(top + height + mm(0.5) + at * 10.5, 10.5, 7.75))
  })
  return top + height + mm(0.5) + lines.length * 10.5
}

/** Rings with their labels, each where it covers neither a line nor another label. */
function drawMarks(paper: Paper, marks: readonly (Spot & { label: string })[], lines: readonly (readonly Spot[])[], plot: { left: number; right: number; top: number; bottom: number }, size: number): void {
  const taken: { left: number; top: number; right: number; bottom: number }[] = marks.map(({ x, y }) => ({ left: x - 2.5, right: x + 2.5, top: y - 2.5, bottom: y + 2.5 }))
  for (const mark of marks) {
    paper.doc.circle(mark.x, mark.y, 2.2).lineWidth(1).fillAndStroke('#FFFFFF', ink)
    const spans = mark.label.split(' ').flatMap((word, at) => [...(at > 0 ? [{ text: ' ', face: 'medium' as const, size }] : []), ...symbolSpans(word, { size })])
    const place = clearPlace(mark, { width: paper.widthOf(spans), height: size }, { lines, taken, plot })
    taken.push(place)
    paper.put(spans, place.left, place.bottom - size * 0.22)
  }
}

function axis({ label, unit }: { label: string; unit: string }): string {
  return unit && !label.includes(unit) ? `${lower(label)} in ${written(unit)}` : lower(label)
}

const lower = (text: string) => text.charAt(0).toLowerCase() + text.slice(1)
const plain = (value: number) => String(Number(value.toPrecision(10))).replace('-', '−')
