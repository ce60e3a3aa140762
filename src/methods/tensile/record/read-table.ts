import type { TextTable } from '../../../../shared/tensile/record.ts'

export const delimiters = [',', ';', '\t', '|'] as const
export type Delimiter = (typeof delimiters)[number]

/** How the text of a record is cut into a table. */
export type TableManner = { delimiter: Delimiter; headingRows: number }

/** The rows of a record's text, the first `most` or all. */
export async function readRows(text: string, delimiter: Delimiter, most?: number): Promise<string[][]> {
  const { default: Papa } = await import('papaparse')
  return Papa.parse<string[]>(text.replace(/^\ufeff/, ''), { delimiter, skipEmptyLines: false, ...(most !== undefined && { preview: most }) }).data
}

/** Rows as columns with names, without the heading. Columns without a name are named by their place, repeated names by a number. */
export function tableOf(rows: readonly (readonly string[])[], headingRows: number): TextTable {
  const body = rows.slice(headingRows)
  const width = rows.slice(0, headingRows + 50).reduce((most, row) => Math.max(most, row.length), 0)
  const names: string[] = []
  for (let place = 0; place < width; place++) {
    const heads = rows.slice(0, headingRows).map((row) => row[place]?.trim() ?? '').filter(Boolean).slice(-2)
    const name = heads.join(' ') || `column ${place + 1}`
    names.push(names.includes(name) ? `${name} (${place + 1})` : name)
  }
  return { names, columns: names.map((_, place) => body.map((row) => row[place] ?? '')), headingRows }
}

const numeric = /^\s*[+\-−]?(\d+[.,]?\d*|[.,]\d+)(e[+-]?\d+)?\s*$/i

/** The delimiter that cuts the first rows into the most columns of numbers, alike in every row. */
export async function findManner(text: string): Promise<TableManner & { decimal: '.' | ',' }> {
  const tried = await Promise.all(delimiters.map(async (delimiter) => {
    const rows = await readRows(text, delimiter, 60)
    const headingRows = firstOfNumbers(rows)
    const columns = (rows[headingRows] ?? []).filter((cell) => numeric.test(cell)).length
    const cells = rows.slice(headingRows).flat()
    const commas = cells.filter((cell) => /^\s*[+\-−]?\d*,\d+/.test(cell)).length
    return { delimiter, headingRows, columns, decimal: commas > cells.filter((cell) => /\d\.\d/.test(cell)).length ? (',' as const) : ('.' as const) }
  }))
  // a decimal comma read as a delimiter doubles the columns; the other delimiters do not occur in numbers and go first
  const [comma, ...others] = tried
  const best = others.reduce((most, one) => (one.columns > most.columns ? one : most), { ...tried[1]!, columns: 1 })
  const { delimiter, headingRows, decimal } = best.columns >= 2 ? best : (comma ?? best)
  return { delimiter, headingRows, decimal }
}

/** The first row from which on three rows hold two numbers or more. */
function firstOfNumbers(rows: readonly (readonly string[])[]): number {
  const holds = (row: readonly string[] | undefined) => (row ?? []).filter((cell) => numeric.test(cell)).length >= 2
  const found = rows.findIndex((_, at) => holds(rows[at]) && holds(rows[at + 1] ?? rows[at]) && holds(rows[at + 2] ?? rows[at]))
  return Math.max(0, found)
}
