import { toSVG } from 'bwip-js/node'
import type { ReportContent } from '../../../../shared/reports/content.ts'
import { timeWords } from '../../../../shared/reports/words/day-words.ts'
import { edge, ink, mm, page, quiet, width } from './ink.ts'
import { baseline, type Element, type Paper } from './paper.ts'

const size = mm(19)

/** Foot of the first page: how to check the report, and who signed it. */
export function drawFoot(paper: Paper, content: ReportContent): void {
  const { doc } = paper
  doc.switchToPage(0)
  const section = paper.section()
  const bottom = page.bottom
  paper.decor(() => paper.rule(bottom - size - mm(3), ink))
  const full = `${content.number}/${content.revision}`
  paper.tag(section, 'Figure', () => drawCode(paper, checkLink(content), page.left, bottom - size), { alt: `Data Matrix code with the address where report ${full} can be checked` })
  const x = page.left + size + mm(5)
  const column = (width - size - mm(15) - mm(17)) / 2
  const lines: [string, 'medium' | 'regular'][] = [['Genuine and current?', 'medium'], ...paper.wrap([{ text: content.checkAddress, size: 8.25 }], column).map(({ spans }): [string, 'regular'] => [spans.map(({ text }) => text).join(''), 'regular'])]
  paper.tag(section, 'P', () => {
    for (const [at, [text, face]] of lines.entries()) paper.put([{ text, face, size: 8.25 }], x, baseline(bottom - (lines.length + 2 - at) * 11, 11, 8.25))
    paper.put([{ text: 'report ', size: 8.25 }, { text: full, face: 'mono', size: 8 }], x, baseline(bottom - 22, 11, 8.25))
    paper.put([{ text: 'code ', size: 8.25 }, { text: content.code, face: 'mono', size: 8 }], x, baseline(bottom - 11, 11, 8.25))
  })
  drawSignature(paper, section, content, x + column + mm(5), bottom, column)
}

function drawSignature(paper: Paper, section: Element, { signatory, dates, site }: ReportContent, x: number, bottom: number, within: number): void {
  const said = paper.wrap([{ text: `${signatory.name}, ${signatory.role}`, face: 'medium', size: 8.25 }], within)
  const under = bottom - (said.length + 1) * 11
  paper.tag(section, 'P', () => {
    paper.put([{ text: signatory.name, size: 15 }], x, under - mm(2.4))
    for (const [at, { spans }] of said.entries()) paper.put(spans, x, baseline(under + at * 11, 11, 8.25))
    paper.put([{ text: `signed electronically ${timeWords(dates.issued, site.timeZone)}`, size: 8.25 }], x, baseline(bottom - 11, 11, 8.25))
  })
  paper.decor(() => paper.rule(under - mm(1), edge, x, x + within))
}

/** Number and page on every page, and on later pages what they belong to. */
export function drawPageNumbers(paper: Paper, content: ReportContent): void {
  const full = `${content.number}/${content.revision}`
  for (let at = 0; at < paper.pages; at += 1) {
    paper.doc.switchToPage(at)
    const right = { align: 'right', within: width } as const
    paper.decor(() => {
      paper.put([{ text: `page ${at + 1} of ${paper.pages}`, size: 8.25, color: quiet }], page.left, page.bottom - 2.6, right)
      if (at === 0) return
      paper.put([{ text: `${content.title} `, size: 8.25, color: quiet }, { text: full, face: 'mono', size: 8, color: quiet }], page.left, page.top + 8)
      paper.put([{ text: content.company.name, size: 8.25, color: quiet }], page.left, page.top + 8, right)
      paper.rule(page.top + 13, edge)
      paper.put([{ text: `${content.customer.name}, job `, size: 8.25, color: quiet }, { text: content.jobNumber, face: 'mono', size: 8, color: quiet }], page.left, page.bottom - 2.6)
    })
  }
}

/** A clear end, so that a missing page is noticed (ISO/IEC 17025:2017, 7.8.2.1 d). */
export function drawEnd(paper: Paper, { number, revision }: ReportContent): void {
  // below the last line there is always room for it
  paper.y += mm(1.5)
  const section = paper.section()
  const text = [{ text: `End of report ${number}/${revision}`, size: 8.5, color: quiet }]
  const side = (width - paper.widthOf(text)) / 2 - mm(3)
  const y = paper.y
  paper.decor(() => {
    paper.rule(y + 6, edge, page.left, page.left + side)
    paper.rule(y + 6, edge, page.right - side, page.right)
  })
  paper.tag(section, 'P', () => paper.put(text, page.left, baseline(y, 12, 8.5), { align: 'center', within: width }))
  paper.y += 12
}

/** The address that the code on the paper opens. */
export function checkLink({ checkAddress, number, revision, code }: Pick<ReportContent, 'checkAddress' | 'number' | 'revision' | 'code'>): string {
  return `${checkAddress}?${new URLSearchParams({ number: `${number}/${revision}`, code }).toString()}`
}

/** A Data Matrix (ISO/IEC 16022) of vectors, black on the paper's own quiet zone. */
function drawCode({ doc }: Paper, text: string, left: number, top: number): void {
  const svg = toSVG({ bcid: 'datamatrix', text, scale: 2 })
  const side = Number(/viewBox="0 0 (\d+)/.exec(svg)?.[1])
  const path = /<path d="([^"]+)"/.exec(svg)?.[1]
  if (!path || !(side > 0)) throw new Error('the code could not be drawn')
  doc.save().translate(left, top).scale(size / side).path(path).fill(ink, 'even-odd').restore()
}
