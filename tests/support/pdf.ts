import { execFile } from 'node:child_process'
import { mkdtemp, rm, writeFile } from 'node:fs/promises'
import { tmpdir } from 'node:os'
import { join } from 'node:path'
import { promisify } from 'node:util'

const run = promisify(execFile)

/** What other programs find in a PDF: its text page by page, its fonts, and what it says of itself. */
export async function readPdf(content: Buffer): Promise<{ pages: string[]; text: string; fonts: { name: string; embedded: boolean; unicode: boolean }[]; info: Record<string, string>; structure: string }> {
  const folder = await mkdtemp(join(tmpdir(), 'report-'))
  const file = join(folder, 'report.pdf')
  try {
    await writeFile(file, content)
    const ask = async (program: string, ...options: string[]) => (await run(program, options, { maxBuffer: 64 * 1024 * 1024 })).stdout
    const text = await ask('pdftotext', '-layout', file, '-')
    const fonts = (await ask('pdffonts', file)).trim().split('\n').slice(2).map((line) => ({ name: line.split(' ')[0] ?? '', ...marks(line) }))
    const info = Object.fromEntries((await ask('pdfinfo', file)).trim().split('\n').map((line) => [line.slice(0, line.indexOf(':')), line.slice(line.indexOf(':') + 1).trim()]))
    return { text, pages: text.split('\f').slice(0, -1), fonts, info, structure: await ask('pdfinfo', '-struct', file) }
  } finally {
    await rm(folder, { recursive: true })
  }
}

function marks(line: string): { embedded: boolean; unicode: boolean } {
  const [, embedded, , unicode] = /(yes|no) +(yes|no) +(yes|no) +\d+ +\d+$/.exec(line) ?? []
  return { embedded: embedded === 'yes', unicode: unicode === 'yes' }
}
