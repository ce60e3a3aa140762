import { readFileSync } from 'node:fs'
import { createRequire } from 'node:module'
import type PDFDocument from 'pdfkit'
import { sfntOf } from './sfnt-of.ts'

type Doc = InstanceType<typeof PDFDocument>
export type Face = 'regular' | 'medium' | 'bold' | 'mono' | 'mono medium'

const require = createRequire(import.meta.url)
/** The subsets of a family in which a character is looked for, in this order; each is a font of its own. */
const subsets = { roboto: ['latin', 'latin-ext', 'greek', 'math', 'symbols', 'cyrillic', 'vietnamese'], 'roboto-mono': ['latin', 'latin-ext', 'greek', 'cyrillic', 'vietnamese'] } as const
const faces: Record<Face, { family: keyof typeof subsets; weight: 400 | 500 | 700; otherwise?: Face }> = {
  regular: { family: 'roboto', weight: 400 }, medium: { family: 'roboto', weight: 500 }, bold: { family: 'roboto', weight: 700 },
  mono: { family: 'roboto-mono', weight: 400, otherwise: 'regular' }, 'mono medium': { family: 'roboto-mono', weight: 500, otherwise: 'medium' },
}

/** pdfkit keeps the font that is chosen in `_font`; nothing public tells whether a font has a sign. */
type WithFont = { _font: { font: { hasGlyphForCodePoint(point: number): boolean } } }

type Run = { font: string; text: string; width: number }

/** The fonts of one document: text is cut into runs, each in the first subset that holds all of its characters. */
export class Fonts {
  private readonly registered = new Set<string>()
  private readonly set = new Map<string, readonly Run[]>()
  private readonly places = new Map<string, string>()
  private readonly doc: Doc
  constructor(doc: Doc) {
    this.doc = doc
  }

  /** Text in runs of one font each, with their widths at size 1. What no font holds becomes a question mark. */
  runs(text: string, face: Face): readonly Run[] {
    const key = `${face} ${text}`
    const known = this.set.get(key)
    if (known) return known
    const runs: { font: string; text: string }[] = []
    for (const character of text) {
      const font = this.fontOf(character, face)
      const last = runs.at(-1)
      const shown = font === null ? '?' : character
      const name = font ?? this.fontOf('?', face)!
      if (last?.font === name) last.text += shown
      else runs.push({ font: name, text: shown })
    }
    const measured = runs.map((run) => ({ ...run, width: this.doc.font(run.font).fontSize(100).widthOfString(run.text) / 100 }))
    this.set.set(key, measured)
    return measured
  }

  /** Width at size 1. */
  widthOf(text: string, face: Face): number {
    return this.runs(text, face).reduce((sum, run) => sum + run.width, 0)
  }

  private fontOf(character: string, face: Face): string | null {
    const key = `${face} ${character}`
    const known = this.places.get(key)
    if (known !== undefined) return known || null
    const { family, weight, otherwise } = faces[face]
    const subset = subsets[family].find((one) => this.has(`${family}-${one}-${weight}-normal`, character))
    const found = subset ? `${family}-${subset}-${weight}-normal` : otherwise ? this.fontOf(character, otherwise) : null
    this.places.set(key, found ?? '')
    return found
  }

  private has(font: string, character: string): boolean {
    if (!this.registered.has(font)) {
      this.registered.add(font)
      this.doc.registerFont(font, fontFile(font))
    }
    this.doc.font(font)
    return (this.doc as unknown as WithFont)._font.font.hasGlyphForCodePoint(character.codePointAt(0)!)
  }
}

const loaded = new Map<string, Buffer>()

/** A font of the package, ready for pdfkit; read once a process. */
export function fontFile(font: string): Buffer {
  const known = loaded.get(font)
  if (known) return known
  const path = require.resolve(`@fontsource/${font.startsWith('roboto-mono') ? 'roboto-mono' : 'roboto'}/files/${font}.woff`)
  const read = sfntOf(readFileSync(path))
  loaded.set(font, read)
  return read
}
