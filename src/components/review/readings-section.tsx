import type { ReactNode } from 'react'
import type { Reading, TestRun } from '../../../shared/api/test-runs.ts'
import { splitPath } from '../../../shared/method/entries.ts'
import type { Field } from '../../../shared/method/field.ts'
import { formFields } from '../../../shared/method/form.ts'
import type { Method } from '../../../shared/method/method.ts'
import { methodOf } from '../../../shared/methods.ts'
import { formatTime, formatWhen, isSameDay } from '../../lib/format.ts'
import { asValues } from '../ui/form/field-value.ts'
import { SideSection } from '../ui/side-section.tsx'
import type { Column } from '../ui/table/column.ts'
import { PlainTable } from '../ui/table/plain-table.tsx'
import { Two } from '../ui/table/two.tsx'
import { unitOf, valueWords } from './value-words.ts'

type Row = Reading & { field: Field | undefined; name: string }

/** Everything that was kept, as it was kept, with what was struck out and why. */
export function ReadingsSection({ run }: { run: TestRun }) {
  const method = methodOf(run.methodId)
  if (!method) return null
  const set = run.readings.filter(({ path }) => isRow(path)).toSorted((a, b) => rowOf(a.path) - rowOf(b.path) || a.at.localeCompare(b.at))
  const named = run.readings.filter(({ path }) => !isRow(path))
  const live = run.readings.filter(({ struck }) => !struck).length
  const struck = run.readings.length - live
  return (
    <SideSection className="mb-6.5" title="Readings" aside={[`${live} kept`, ...(struck > 0 ? [`${struck} struck out`] : [])].join(', ')}>
      {run.readings.length === 0 && <p className="text-quiet">Nothing was kept.</p>}
      {set.length > 0 && <PlainTable caption="Readings" columns={setColumns(method, run)} rows={set.map((reading) => ({ ...reading, field: undefined, name: String(rowOf(reading.path) + 1) }))} rowId={({ id }) => id} className={named.length > 0 ? 'mb-5' : undefined} />}
      {named.length > 0 && <PlainTable caption="Measured" columns={namedColumns(run)} rows={named.map((reading) => namedRow(method, reading))} rowId={({ id }) => id} />}
    </SideSection>
  )
}

/** What a field is called, for choosing readings to send back too. */
export function readingName(method: Method | undefined, { path }: Reading): string {
  if (isRow(path)) return `Reading ${rowOf(path) + 1}`
  return (method && fieldAt(method, path)?.label) ?? splitPath(path)[1]
}

function setColumns(method: Method, run: TestRun): Column<Row>[] {
  const fields = formFields(method.readings)
  return [
    { id: 'row', head: 'No', numeric: true, cell: (row) => <Struck row={row}>{row.name}</Struck> },
    ...fields.map((field): Column<Row> => ({
      id: field.name, head: field.label, unit: unitOf(field), numeric: field.kind === 'number', cell: (row) => <Struck row={row}><span className={field.kind === 'number' ? 'mono' : undefined}>{valueWords(field, asValues(row.value)[field.name])}</span></Struck>,
    })),
    ...whenAndStruck(run),
  ]
}

function namedColumns(run: TestRun): Column<Row>[] {
  return [
    { id: 'what', head: 'What', cell: (row) => <Struck row={row}>{row.name}</Struck> },
    { id: 'value', head: 'Value', cell: (row) => <Struck row={row}><span className="mono">{valueWords(row.field, row.value)}</span>{unitOf(row.field) && <span className="unit"> {unitOf(row.field)}</span>}</Struck> },
    ...whenAndStruck(run),
  ]
}

function whenAndStruck({ timeZone, startedAt, performedBy }: TestRun): Column<Row>[] {
  return [
    { id: 'at', head: 'Kept', nowrap: true, cell: ({ at, by }) => <>{isSameDay(at, startedAt, timeZone) ? formatTime(at, { zone: timeZone }) : formatWhen(at, 'short', { zone: timeZone })}{by !== performedBy && <Two>{by}</Two>}</> },
    { id: 'struck', head: 'Struck out', cell: ({ struck }) => struck && <>{struck.reason}<Two>{struck.by}, {formatTime(struck.at, { zone: timeZone })}</Two></> },
  ]
}

function Struck({ row, children }: { row: Row; children: ReactNode }) {
  return row.struck ? <s className="text-quiet">{children}</s> : <>{children}</>
}

const isRow = (path: string) => /^readings\.\d+$/.test(path)
const rowOf = (path: string) => Number(splitPath(path)[1])

function namedRow(method: Method, reading: Reading): Row {
  return { ...reading, field: fieldAt(method, reading.path), name: readingName(method, reading) }
}

function fieldAt(method: Method, path: string): Field | undefined {
  const [side, key] = splitPath(path)
  return formFields(side === 'parameters' ? method.parameters : method.readings).find(({ name }) => name === key)
}
