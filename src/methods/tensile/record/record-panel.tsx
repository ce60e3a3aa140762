import { useEffect, useMemo, useState } from 'react'
import { checkEntry } from '../../../../shared/method/check-entry.ts'
import { extensionUnits, forceUnits, loadExtensionRecord, RecordError, timeUnits, type RecordChoices } from '../../../../shared/tensile/record.ts'
import { Button } from '../../../components/ui/buttons/button.tsx'
import { Meter } from '../../../components/ui/feedback/meter.tsx'
import { Note } from '../../../components/ui/feedback/note.tsx'
import { NumberField } from '../../../components/ui/fields/number-field.tsx'
import { SelectField } from '../../../components/ui/fields/select-field.tsx'
import type { SheetViewProps } from '../../sheet-view.ts'
import { ColumnChooser } from './column-chooser.tsx'
import type { Columns } from './guess-columns.ts'
import { RecordPreview } from './record-preview.tsx'
import { delimiters, readRows, tableOf, type TableManner } from './read-table.ts'
import { rememberChoices } from './remembered-choices.ts'

export type Opened = { file: File; text: string; manner: TableManner; decimal: '.' | ','; columns: { extension: { column: string; unit: string }; force: { column: string; unit: string }; time?: { column: string; unit: string } | undefined } }

const delimiterNames: Record<(typeof delimiters)[number], string> = { ',': 'comma', ';': 'semicolon', '\t': 'tab', '|': 'bar' }
/** Of the request that carries it, characters. */
const longest = 28_000_000

/** What was found in the record, to be corrected before it is taken. */
export function RecordPanel({ sheet, opened: { file, text, manner: firstManner, decimal: firstDecimal, columns: firstColumns }, onClose }: { sheet: SheetViewProps; opened: Opened; onClose: () => void }) {
  const [manner, setManner] = useState(firstManner)
  const [decimal, setDecimal] = useState(firstDecimal)
  const [columns, setColumns] = useState(() => asColumns(firstColumns))
  const [rows, setRows] = useState<string[][]>([])
  const [share, setShare] = useState<number>()
  const [problem, setProblem] = useState<string>()
  useEffect(() => {
    let isOver = false
    void readRows(text, manner.delimiter, 200).then((found) => { if (!isOver) setRows(found) })
    return () => { isOver = true }
  }, [text, manner.delimiter])
  const table = useMemo(() => tableOf(rows, manner.headingRows), [rows, manner.headingRows])
  const gaugeLengthMm = numberOf(sheet.live.parameters['extensometerGaugeLengthMm']) ?? numberOf(sheet.live.parameters['originalGaugeLengthMm'])
  const missing = !columns.extension.column ? 'Choose the column of the extension.' : !columns.force.column ? 'Choose the column of the force.' : ''

  const take = async () => {
    setProblem(undefined)
    try {
      const choices: RecordChoices = { ...columns, decimal, ...(gaugeLengthMm !== undefined && { gaugeLengthMm }) }
      const value = loadExtensionRecord(tableOf(await readRows(text, manner.delimiter), manner.headingRows), choices)
      const wrong = checkEntry(sheet.method, 'readings.curve', value)
      if (wrong !== null) return setProblem(`The record cannot be kept: ${wrong}.`)
      if (JSON.stringify(value).length > longest) return setProblem(`The record has ${value.forceN.length} points, too many for one run. Take every second point at the frame.`)
      setShare(0)
      await sheet.addRecord(file, setShare)
      sheet.keep([{ path: 'readings.curve', value }])
      rememberChoices(sheet.run.benchId, { ...manner, decimal, ...columns })
      onClose()
    } catch (error) {
      setShare(undefined)
      setProblem(error instanceof RecordError ? error.faults.slice(0, 3).map(({ column, row, message }) => `${row === undefined ? '' : `Row ${row}, `}${column}: ${message}.`).join(' ') : error instanceof Error ? error.message : 'The record was not taken.')
    }
  }
  return (
    <section aria-label="The record" className="mt-2 grid gap-4 border-t border-ink pt-3">
      <h2 className="flex flex-wrap items-baseline justify-between gap-3"><b className="text-15 font-bold">{file.name}</b><span className="text-13 text-quiet">Look at what was found, correct it, then take it.</span></h2>
      <div className="grid grid-cols-[repeat(auto-fit,minmax(150px,1fr))] items-start gap-4">
        <SelectField label="Between columns" value={manner.delimiter} choices={delimiters.map((value) => ({ value, label: delimiterNames[value] }))} onChange={(event) => setManner({ ...manner, delimiter: delimiters.find((one) => one === event.target.value) ?? ',' })} />
        <SelectField label="Decimal mark" value={decimal} choices={[{ value: '.', label: 'point' }, { value: ',', label: 'comma' }]} onChange={(event) => setDecimal(event.target.value === ',' ? ',' : '.')} />
        <NumberField label="Rows of heading" value={manner.headingRows} step={1} min={0} max={200} onValue={(headingRows) => setManner({ ...manner, headingRows: Math.max(0, Math.round(headingRows ?? 0)) })} />
      </div>
      <div className="grid grid-cols-[repeat(auto-fit,minmax(270px,1fr))] items-start gap-4">
        <ColumnChooser label="Extension" names={table.names} units={extensionUnits} value={columns.extension} onValue={(extension) => setColumns({ ...columns, extension })} />
        <ColumnChooser label="Force" names={table.names} units={forceUnits} value={columns.force} onValue={(force) => setColumns({ ...columns, force })} />
        <ColumnChooser label="Time" isOptional names={table.names} units={timeUnits} value={columns.time ?? { column: '', unit: 's' }} onValue={(time) => setColumns({ extension: columns.extension, force: columns.force, ...(time.column && { time }) })} />
      </div>
      <RecordPreview table={table} chosen={[columns.extension.column, columns.force.column, columns.time?.column]} decimal={decimal} />
      {problem && <Note kind="bad" title="Not taken.">{problem}</Note>}
      {share !== undefined && <Meter percent={share * 100} label={`${file.name} on its way`} />}
      <div className="flex flex-wrap items-center gap-3">
        <Button size="big" busy={share !== undefined} refusal={missing} onClick={() => void take()}>Take this record</Button>
        <Button size="big" kind="soft" onClick={onClose}>Leave it</Button>
      </div>
    </section>
  )
}

/** What was remembered or guessed, with units that are known. */
function asColumns({ extension, force, time }: Opened['columns']): Columns {
  const unit = <U extends string>(units: Readonly<Record<U, number>>, asked: string, usual: U) => (Object.keys(units) as U[]).find((one) => one === asked) ?? usual
  return {
    extension: { column: extension.column, unit: unit(extensionUnits, extension.unit, 'mm') },
    force: { column: force.column, unit: unit(forceUnits, force.unit, 'N') },
    ...(time && { time: { column: time.column, unit: unit(timeUnits, time.unit, 's') } }),
  }
}

function numberOf(value: unknown): number | undefined {
  return typeof value === 'number' ? value : undefined
}
