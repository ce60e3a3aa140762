import PDFDocument from 'pdfkit'
import type { ReportContent } from '../../../../shared/reports/content.ts'
import { symbolParts } from '../../../../shared/reports/words/symbol-parts.ts'
import { Fonts, type Face } from './fonts.ts'
import { hairline, ink, mm, page, width } from './ink.ts'

type Doc = InstanceType<typeof PDFDocument>
export type Element = ReturnType<Doc['struct']>
export type Span = { text: string; face?: Face; size?: number; color?: string; drop?: number }
export type Line = { spans: Span[]; width: number }
/** What pdfkit takes besides what its types know: whose cells a head is for, and where a figure stands. */
type Tagged = NonNullable<Parameters<Doc['struct']>[1]> & { scope?: 'Column'; bbox?: [number, number, number, number] }

/** Where the first page ends for text: its foot holds code and signature. */
const firstBottom = page.bottom - mm(23.5)
const laterTop = page.top + mm(9)
const laterBottom = page.bottom - mm(10)
const usualSize = 9.25

/** PDF/UA-1: pdfkit knows it, its types do not yet. */
const accessible = { subset: 'PDF/UA' } as unknown as { subset?: undefined }

/** A tagged A4 document, filled from the top. Text is set here in runs of fonts, so that it holds every sign the trade writes. */
export class Paper {
  readonly doc: Doc
  readonly root: Element
  private readonly fonts: Fonts
  y: number = page.top
  pages = 1

  constructor(content: Pick<ReportContent, 'number' | 'revision' | 'title' | 'company' | 'dates'>) {
    const issued = new Date(content.dates.issued)
    // fixed dates and names: the same content gives the same bytes
    this.doc = new PDFDocument({
      size: 'A4', margin: 0, bufferPages: true, pdfVersion: '1.7', ...accessible, tagged: true, lang: 'en-GB', displayTitle: true, font: '',
      info: {
        Title: `${content.title} ${content.number}/${content.revision}`, Author: content.company.name, Subject: content.title, Creator: 'Crosshead', Producer: 'Crosshead',
        CreationDate: issued, ModDate: issued,
      },
    })
    this.root = this.doc.struct('Document')
    this.doc.addStructure(this.root)
    this.fonts = new Fonts(this.doc)
  }

  get bottom(): number {
    return this.pages === 1 ? firstBottom : laterBottom
  }

  section(): Element {
    const element = this.doc.struct('Sect')
    this.root.add(element)
    return element
  }

  /** Starts a page when less than this is left on the present one. */
  need(height: number): boolean {
    if (this.y + height <= this.bottom) return false
    this.turn()
    return true
  }

  turn(): void {
    this.doc.addPage()
    this.pages += 1
    this.y = laterTop
  }

  /** Draws something that screen readers meet as an element of this kind. */
  tag(parent: Element, type: string, draw: () => void, options: Tagged = {}): void {
    const content = this.doc.markStructureContent(type)
    draw()
    this.doc.endMarkedContent()
    parent.add(this.doc.struct(type, options, [content]))
  }

  /** Draws what carries no meaning of its own: rules, repeated heads, page numbers. */
  decor(draw: () => void): void {
    this.doc.markContent('Artifact', { type: 'Layout' })
    draw()
    this.doc.endMarkedContent()
  }

  widthOf(spans: readonly Span[]): number {
    return spans.reduce((sum, { text, face = 'regular', size = usualSize }) => sum + this.fonts.widthOf(text, face) * size, 0)
  }

  /** Sets one line with its baseline at `y`. */
  put(spans: readonly Span[], x: number, y: number, { align = 'left', within = 0 }: { align?: 'left' | 'right' | 'center'; within?: number } = {}): void {
    let at = align === 'left' ? x : x + (within - this.widthOf(spans)) / (align === 'right' ? 1 : 2)
    for (const { text, face = 'regular', size = usualSize, color = ink, drop = 0 } of spans) {
      for (const run of this.fonts.runs(text, face)) {
        this.doc.font(run.font).fontSize(size).fillColor(color).text(run.text, at, y + drop, { lineBreak: false, baseline: 'alphabetic' })
        at += run.width * size
      }
    }
  }

  /** Breaks text into lines no wider than this, between words; a word that is wider is broken where it must be. */
  wrap(spans: readonly Span[], within: number): Line[] {
    const lines: Line[] = [{ spans: [], width: 0 }]
    for (const span of spans) {
      for (const word of span.text.split(/(?<=[ \n])/)) {
        for (const piece of this.widthOf([{ ...span, text: word.trimEnd() }]) > within ? this.pieces(word, span, within) : [word]) this.add(lines, { ...span, text: piece }, within)
        if (word.endsWith('\n')) lines.push({ spans: [], width: 0 })
      }
    }
    return lines
  }

  private add(lines: Line[], word: Span, within: number): void {
    const clean = { ...word, text: word.text.replace('\n', '') }
    const solid = this.widthOf([{ ...clean, text: clean.text.trimEnd() }])
    const fitting = lines.at(-1)!
    const line = fitting.spans.length > 0 && fitting.width + solid > within + 0.01 ? { spans: [], width: 0 } : fitting
    if (line !== fitting) lines.push(line)
    const last = line.spans.at(-1)
    if (last && last.face === clean.face && last.size === clean.size && last.color === clean.color && last.drop === clean.drop) last.text += clean.text
    else line.spans.push(clean)
    line.width += this.widthOf([clean])
  }

  private pieces(word: string, span: Span, within: number): string[] {
    const pieces = ['']
    for (const character of word) {
      if (this.widthOf([{ ...span, text: `${pieces.at(-1)}${character}` }]) > within && pieces.at(-1) !== '') pieces.push('')
      pieces[pieces.length - 1] += character
    }
    return pieces
  }

  /** Sets a paragraph at the present place, on more pages when it is long. */
  paragraph(parent: Element, spans: readonly Span[], { x = page.left, within = width, leading = 11.75, after = 0, type = 'P' }: { x?: number; within?: number; leading?: number; after?: number; type?: string } = {}): void {
    const lines = this.wrap(spans, within)
    for (let from = 0; from < lines.length;) {
      // the first two lines of a paragraph stay together
      this.need(leading * Math.min(2, lines.length - from))
      const fit = Math.max(1, Math.min(lines.length - from, Math.floor((this.bottom - this.y) / leading)))
      this.tag(parent, type, () => {
        for (const line of lines.slice(from, from + fit)) {
          this.put(line.spans, x, baseline(this.y, leading, line.spans[0]?.size))
          this.y += leading
        }
      })
      from += fit
    }
    this.y += after
  }

  /** A heading under its rule; `keep` is what has to stand on the same page with it. */
  heading(parent: Element, text: string, keep = mm(20)): void {
    this.need(mm(8) + keep)
    // at the top of a page the rule of the running head stands there already
    if (this.pages === 1 || this.y > laterTop) {
      this.decor(() => this.rule(this.y, ink))
      this.y += mm(2)
    }
    this.tag(parent, 'H2', () => this.put([{ text, face: 'bold' }], page.left, baseline(this.y, 12)))
    this.y += 12 + mm(1.5)
  }

  rule(y: number, color: string = hairline, from: number = page.left, to: number = page.right, weight = 0.75): void {
    this.doc.moveTo(from, y).lineTo(to, y).lineWidth(weight).strokeColor(color).stroke()
  }

  /** Ends all elements and gives the file. */
  async bytes(): Promise<Buffer> {
    this.root.end()
    const parts: Buffer[] = []
    const done = new Promise<void>((resolve, reject) => {
      this.doc.on('data', (part: Buffer) => parts.push(part))
      this.doc.on('end', resolve)
      this.doc.on('error', reject)
    })
    this.doc.end()
    await done
    return Buffer.concat(parts)
  }
}

/** Where the baseline lies in a line of this leading whose top is at `y`. Roboto reaches 0.928 above and 0.244 below. */
export function baseline(y: number, leading: number, size = usualSize): number {
  return y + (leading - size * 1.172) / 2 + size * 0.928
}

/** A symbol with its index below the line. */
export function symbolSpans(symbol: string, { face = 'medium', size = 8.5, color = ink }: Omit<Span, 'text' | 'drop'> = {}): Span[] {
  return symbolParts(symbol).map(({ text, below }) => (below ? { text, face, size: size * 0.76, color, drop: size * 0.17 } : { text, face, size, color }))
}
