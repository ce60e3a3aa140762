import { MOST_POINTS } from './column.ts'

/** What a column of a test frame's record can be given in, and the factor to mm, N or s. */
export const extensionUnits = { mm: 1, 'µm': 0.001, in: 25.4, '% of gauge length': 0.01 } as const
export const forceUnits = { N: 1, kN: 1000, lbf: 4.4482216152605 } as const
export const timeUnits = { s: 1, ms: 0.001, min: 60 } as const

export type ColumnChoice<Unit extends string> = { column: string; unit: Unit }
export type RecordChoices = {
  extension: ColumnChoice<keyof typeof extensionUnits>
  force: ColumnChoice<keyof typeof forceUnits>
  time?: ColumnChoice<keyof typeof timeUnits>
  /** Needed where the extension is given in % of it. */
  gaugeLengthMm?: number
  decimal: '.' | ','
}

/** A table as text: the names of its columns and their cells, column by column, without the heading. */
export type TextTable = { names: readonly string[]; columns: readonly (readonly string[])[]; headingRows: number }

export type LoadExtensionRecord = { extensionMm: number[]; forceN: number[]; timeS?: number[] }
/** A fault with where it is: `column` by name, `row` as counted in the file, from 1. */
export type RecordFault = { column: string; row?: number; message: string }

/** A record cannot be read; `faults` names row and column, the first twenty. */
export class RecordError extends Error {
  readonly faults: RecordFault[]
  constructor(faults: RecordFault[]) {
    super(faults.map(({ column, row, message }) => `${row === undefined ? '' : `row ${row}, `}column "${column}": ${message}`).join('; '))
    this.name = 'RecordError'
    this.faults = faults
  }
}

const MOST_FAULTS = 20

/** Turns the chosen columns into extension in mm, force in N and time in s. Empty rows at the end are left out. Throws RecordError. */
export function loadExtensionRecord(table: TextTable, choices: RecordChoices): LoadExtensionRecord {
  const { extension, force, time, gaugeLengthMm, decimal } = choices
  const faults: RecordFault[] = []
  if (extension.unit === '% of gauge length' && !(gaugeLengthMm !== undefined && gaugeLengthMm > 0)) {
    faults.push({ column: extension.column, message: 'is in % of the gauge length, but the extensometer gauge length is not given' })
  }
  const wanted = [extension.column, force.column, ...(time ? [time.column] : [])]
  const cells = wanted.map((name) => {
    const column = table.columns[table.names.indexOf(name)]
    if (!column || !table.names.includes(name)) faults.push({ column: name, message: `is not in the file, which has ${table.names.map((known) => `"${known}"`).join(', ')}` })
    return column ?? []
  })
  if (faults.length > 0) throw new RecordError(faults)
  const rows = usedRows(cells)
  if (rows < 3) throw new RecordError([{ column: force.column, message: `has ${rows} rows with numbers; a record needs at least 3` }])
  if (rows > MOST_POINTS) throw new RecordError([{ column: force.column, message: `has ${rows} rows; a record may hold ${MOST_POINTS}` }])
  const perUnit = extensionUnits[extension.unit] * (extension.unit === '% of gauge length' ? (gaugeLengthMm ?? 0) : 1)
  const read = (at: number, factor: number) => numbersOf({ name: wanted[at] ?? '', cells: cells[at] ?? [], rows, factor, decimal, headingRows: table.headingRows, faults })
  const extensionMm = read(0, perUnit)
  const forceN = read(1, forceUnits[force.unit])
  const timeS = time && read(2, timeUnits[time.unit])
  if (faults.length > 0) throw new RecordError(faults)
  return { extensionMm, forceN, ...(timeS && { timeS }) }
}

function usedRows(columns: readonly (readonly string[])[]): number {
  let rows = columns.reduce((most, column) => Math.max(most, column.length), 0)
  while (rows > 0 && columns.every((column) => (column[rows - 1] ?? '').trim() === '')) rows--
  return rows
}

type Reading = { name: string; cells: readonly string[]; rows: number; factor: number; decimal: '.' | ','; headingRows: number; faults: RecordFault[] }

function numbersOf({ name, cells, rows, factor, decimal, headingRows, faults }: Reading): number[] {
  const numbers = new Array<number>(rows).fill(0)
  for (let i = 0; i < rows && faults.length < MOST_FAULTS; i++) {
    const cell = cells[i] ?? ''
    const value = decimalNumber(cell, decimal)
    if (value === undefined) faults.push({ column: name, row: headingRows + i + 1, message: cell.trim() === '' ? 'is empty' : `"${cell.trim().slice(0, 40)}" is no number` })
    else numbers[i] = value * factor
  }
  return numbers
}

const WITH_POINT = /^[+-]?(\d+\.?\d*|\.\d+)(e[+-]?\d+)?$/i
const WITH_COMMA = /^[+-]?(\d+,?\d*|,\d+)(e[+-]?\d+)?$/i

/** The number that a cell stands for, or undefined. No grouping of thousands: "1,234" is 1.234 with a decimal comma and no number with a point. */
export function decimalNumber(cell: string, decimal: '.' | ','): number | undefined {
  const text = cell.trim().replace('−', '-')
  if (!(decimal === ',' ? WITH_COMMA : WITH_POINT).test(text)) return undefined
  const value = Number(decimal === ',' ? text.replace(',', '.') : text)
  return Number.isFinite(value) ? value : undefined
}
