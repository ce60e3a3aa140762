import { checkEntry } from '../../../shared/method/check-entry.ts'
import { formFields } from '../../../shared/method/form.ts'
import { Button } from '../../components/ui/buttons/button.tsx'
import { IconButton } from '../../components/ui/buttons/icon-button.tsx'
import { SchemaFields } from '../../components/ui/form/schema-fields.tsx'
import { BigResult } from '../results/big-result.tsx'
import { BrokenRules } from '../results/broken-rules.tsx'
import { ResultFacts } from '../results/result-facts.tsx'
import { SheetColumns } from '../results/sheet-columns.tsx'
import { cellName, typedRow } from '../pending-entries.ts'
import type { SheetViewProps } from '../sheet-view.ts'
import { nextRow, setRows } from './set-rows.ts'
import { keysInOrder, SetView } from './set-view.tsx'

/** A set of any rows: as a grid when all its columns are numbers, else one form for each row. */
export function AnySetView(sheet: SheetViewProps) {
  const fields = formFields(sheet.method.readings)
  return fields.every(({ kind }) => kind === 'number') ? <SetView sheet={sheet} /> : <SetFormView {...sheet} />
}

function SetFormView(sheet: SheetViewProps) {
  const { method, run, readings, live, typed, type, keep, strike, locked } = sheet
  const fields = formFields(method.readings)
  const path = `readings.${nextRow(readings)}`
  const value = typedRow(method, typed)
  const wrong = checkEntry(method, path, value)
  const count = Array.isArray(live.readings) ? live.readings.length : 0
  return (
    <SheetColumns
      left={
        <div className="grid gap-5">
          <ol className="border-t border-ink">
            {setRows(readings, false).map(({ reading, number, counts }) => (
              <li key={reading.key} className="flex min-h-12.5 items-center gap-4 border-b border-line">
                <span className="w-10 text-quiet">{counts ? number : ''}</span>
                <span className={`flex-1 ${reading.struck ? 'text-quiet line-through' : ''}`}>{said(reading.value)}</span>
                {reading.struck ? <span className="text-13 text-quiet">struck out: {reading.struck.reason}</span>
                  : !locked && <IconButton icon="cross" label={`Strike out reading ${number}`} className="size-11!" onClick={() => strike(reading.key)} />}
              </li>
            ))}
          </ol>
          {!locked && (
            <form className="grid gap-4" onSubmit={(event) => { event.preventDefault(); if (wrong === null) { keep([{ path, value }]); type(Object.fromEntries(fields.map(({ name }) => [cellName(name), '']))) } }}>
              <SchemaFields fields={fields} value={value} onValue={(next) => type(Object.fromEntries(fields.map(({ name }) => [cellName(name), asTyped(next[name])])))} />
              <div><Button type="submit" size="big" refusal={Object.keys(value).length > 0 ? wrong : 'Nothing is typed yet.'}>Keep this reading</Button></div>
            </form>
          )}
          <BrokenRules sheet={sheet} rowKeys={keysInOrder(sheet, count)} />
        </div>
      }
      result={<BigResult method={method} run={run} live={live} title={method.title} />}
      more={<ResultFacts method={method} run={run} live={live} />}
    />
  )
}

function asTyped(value: unknown): string {
  return value === undefined ? '' : typeof value === 'string' ? value : JSON.stringify(value)
}

function said(value: unknown): string {
  return typeof value === 'object' && value !== null ? Object.values(value).map((one) => (typeof one === 'object' ? JSON.stringify(one) : String(one))).join(', ') : String(value)
}
