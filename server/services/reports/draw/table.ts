import { hairline, ink, mm, page, width } from './ink.ts'
import { baseline, type Element, type Paper, type Span } from './paper.ts'

export type Cell = { spans: Span[]; span?: number; sign?: 'pass' | 'fail' | 'undecided'; /** Room at its left. */ inset?: number; align?: 'left' | 'right' }
export type Row = { cells: Cell[]; ruleBelow?: string | null }
export type Column = { align: 'left' | 'right'; /** Widest that text of this column gets before it is broken. */ most?: number }
export type TableOf = { columns: Column[]; head: Row[]; body: Row[]; foot?: Row[]; /** Left, in points, before the columns share what is left over. */ gap?: number; pad?: number; leading?: number; /** How much wider a column may become when there is room. */ spread?: number }

const signWidth = 14

/** The width each column wants: its widest cell, broken at `most`. */
export function wantedWidths(paper: Paper, { columns, head, body, foot = [], gap = mm(2) }: TableOf): number[] {
  const wanted = columns.map(() => 0)
  for (const row of [...head, ...body, ...foot]) {
    let at = 0
    for (const cell of row.cells) {
      const { span = 1 } = cell
      if (span === 1) wanted[at] = Math.max(wanted[at]!, Math.min(columns[at]!.most ?? Infinity, cellWidth(paper, cell)))
      at += span
    }
  }
  return wanted.map((one, at) => one + (at < columns.length - 1 ? gap : 0))
}

const before = ({ sign, inset = 0 }: Cell) => inset + (sign ? signWidth : 0)
const cellWidth = (paper: Paper, cell: Cell) => paper.widthOf(cell.spans) + before(cell) + 0.5

/** Draws a table over as many pages as it needs; its head stands on each of them, read out once. */
export function drawTable(paper: Paper, parent: Element, table: TableOf): void {
  const { columns, head, body, foot = [], gap = mm(2), pad = mm(1.15), leading = 11.5, spread = Infinity } = table
  const widths = shared(wantedWidths(paper, table), columns, spread)
  const element = paper.doc.struct('Table')
  parent.add(element)
  const edges = widths.reduce<number[]>((all, one) => [...all, all.at(-1)! + one], [page.left])
  const heightOf = (row: Row, own: number) => linesOf(row).reduce((most, lines) => Math.max(most, lines.length), 1) * leading + own * 2

  function linesOf(row: Row) {
    let at = 0
    return row.cells.map((cell) => {
      const from = at
      at += cell.span ?? 1
      const within = edges[at]! - edges[from]! - (at < columns.length ? gap : 0) - before(cell)
      return paper.wrap(cell.spans, Math.max(within, 8))
    })
  }

  function draw(row: Row, type: 'TH' | 'TD', own: number, tagged: boolean): void {
    const tr = tagged ? paper.doc.struct('TR') : null
    if (tr) element.add(tr)
    const height = heightOf(row, own)
    const lines = linesOf(row)
    let at = 0
    for (const [nth, cell] of row.cells.entries()) {
      const from = at
      at += cell.span ?? 1
      const align = cell.align ?? columns[from]!.align
      const within = edges[at]! - edges[from]! - (at < columns.length ? gap : 0)
      const text = lines[nth]!
      // heads stand on their rule, text hangs from the top
      const top = type === 'TH' ? paper.y + height - text.length * leading : paper.y + (height - text.length * leading) / 2
      const set = () => {
        if (cell.sign) drawSign(paper, cell.sign, edges[from]! + (cell.inset ?? 0), baseline(top, leading))
        for (const [line, { spans }] of text.entries()) paper.put(trimmed(spans), edges[from]! + before(cell), baseline(top + line * leading, leading, spans[0]?.size), { align, within: within - before(cell) })
      }
      if (tr) paper.tag(tr, type, set, type === 'TH' ? { scope: 'Column' } : {})
      else set()
    }
    paper.y += height
  }

  function drawHead(tagged: boolean): void {
    const set = () => {
      for (const row of head) {
        draw(row, 'TH', 0, tagged)
        if (row.ruleBelow) ruled(row.ruleBelow, tagged)
      }
      paper.y += mm(1)
      ruled(ink, tagged)
    }
    if (tagged) set()
    else paper.decor(set)
  }

  function ruled(color: string, alone: boolean): void {
    // a repeated head is decoration already, and decoration holds no other
    if (alone) paper.decor(() => paper.rule(paper.y, color))
    else paper.rule(paper.y, color)
  }

  const rows = [...body, ...foot]
  /** Rows without a rule between them, and the last of the table with what stands under it, stay on one page. */
  const isTied = (at: number) => at >= 0 && at < rows.length - 1 && (rows[at]!.ruleBelow === null || (foot.length > 0 && at >= body.length - 1))
  function tiedHeight(from: number): number {
    let height = heightOf(rows[from]!, pad)
    for (let at = from; isTied(at); at += 1) height += heightOf(rows[at + 1]!, pad)
    return height
  }

  const headHeight = head.reduce((sum, row) => sum + heightOf(row, 0), 0) + mm(2)
  paper.need(headHeight + body.slice(0, 2).reduce((sum, row) => sum + heightOf(row, pad), 0))
  drawHead(true)
  for (const [nth, row] of rows.entries()) {
    const last = nth === body.length + foot.length - 1
    if (!isTied(nth - 1) && paper.need(Math.min(tiedHeight(nth), mm(120)))) drawHead(false)
    else if (paper.need(heightOf(row, pad))) drawHead(false)
    draw(row, 'TD', pad, true)
    if (row.ruleBelow !== null || last) paper.decor(() => paper.rule(paper.y, row.ruleBelow ?? hairline))
  }
}

/** What is left over goes to all columns alike, but not past the last column of text; what is too much is taken from the widest. */
function shared(wanted: readonly number[], columns: readonly Column[], spread: number): number[] {
  const sum = wanted.reduce((total, one) => total + one, 0)
  if (sum > width) {
    const level = widestLevel(wanted)
    return wanted.map((one) => Math.min(one, level))
  }
  const grows = wanted.map((_, at) => columns[at]!.align === 'right' || at < wanted.length - 1)
  const extra = Math.min(spread, (width - sum) / Math.max(1, grows.filter(Boolean).length))
  return wanted.map((one, at) => one + (grows[at] ? extra : 0))
}

/** The greatest width at which columns cut to it fit beside each other. */
function widestLevel(wanted: readonly number[]): number {
  let left = width
  const sorted = [...wanted].sort((a, b) => a - b)
  for (const [at, one] of sorted.entries()) {
    const share = left / (sorted.length - at)
    if (one > share) return share
    left -= one
  }
  return Infinity
}

const trimmed = (spans: readonly Span[]): Span[] => spans.map((span, at) => (at === spans.length - 1 ? { ...span, text: span.text.trimEnd() } : span))

/** A check mark, a cross, or a ring that is half full, beside the word. */
function drawSign({ doc }: Paper, sign: 'pass' | 'fail' | 'undecided', x: number, base: number): void {
  doc.save().lineWidth(1).strokeColor(sign === 'fail' ? '#B3261E' : ink)
  if (sign === 'pass') doc.moveTo(x + 1, base - 3).lineTo(x + 3.4, base - 0.7).lineTo(x + 8.4, base - 6.2).stroke()
  else if (sign === 'fail') doc.moveTo(x + 1.5, base - 6).lineTo(x + 7, base - 0.5).moveTo(x + 7, base - 6).lineTo(x + 1.5, base - 0.5).stroke()
  else { doc.circle(x + 4.2, base - 3.2, 2.8).stroke(); doc.path(`M ${x + 4.2} ${base - 6} A 2.8 2.8 0 0 0 ${x + 4.2} ${base - 0.4} Z`).fill(ink) }
  doc.restore()
}
