import { checkEntry } from '../../../shared/method/check-entry.ts'
import type { Field } from '../../../shared/method/field.ts'
import { formFields } from '../../../shared/method/form.ts'
import { Button } from '../../components/ui/buttons/button.tsx'
import { SchemaFields } from '../../components/ui/form/schema-fields.tsx'
import { counting } from '../../lib/kept-readings/sheet-readings.ts'
import { BigResult } from '../results/big-result.tsx'
import { BrokenRules } from '../results/broken-rules.tsx'
import { ConversionsBox } from '../results/conversions-box.tsx'
import { ResultFacts } from '../results/result-facts.tsx'
import { SheetColumns } from '../results/sheet-columns.tsx'
import { typedValue } from '../pending-entries.ts'
import type { SheetViewProps } from '../sheet-view.ts'
import { KeptNumber } from './kept-number.tsx'
import { keepNamed } from './keep-named.ts'

/** Any method whose readings have names: its fields from the two schemas, what they break, and the results. */
export function NamedView(sheet: SheetViewProps) {
  const { method, run, live } = sheet
  const measured = formFields(method.parameters).filter(({ name }) => method.measured.includes(name))
  return (
    <SheetColumns
      left={
        <div className="grid gap-6">
          {measured.length > 0 && <Part sheet={sheet} side="parameters" title="Before" fields={measured} />}
          <Part sheet={sheet} side="readings" title="Readings" fields={formFields(method.readings)} />
          <BrokenRules sheet={sheet} />
        </div>
      }
      result={<BigResult method={method} run={run} live={live} title={method.title} />}
      more={<><ResultFacts method={method} run={run} live={live} /><ConversionsBox conversions={live.conversions} /></>}
    />
  )
}

function Part({ sheet, side, title, fields }: { sheet: SheetViewProps; side: 'parameters' | 'readings'; title: string; fields: readonly Field[] }) {
  return (
    <fieldset>
      <legend className="mb-3 w-full border-t border-ink pt-2 text-15 font-bold">{title}</legend>
      <div className="grid grid-cols-[repeat(auto-fill,minmax(200px,1fr))] items-start gap-x-5 gap-y-4">
        {fields.map((field) => field.kind === 'number'
          ? <KeptNumber key={field.name} sheet={sheet} path={`${side}.${field.name}`} label={field.label} aside={field.optional ? 'if any' : undefined} unit={field.unit} step={field.step} />
          : <KeptForm key={field.name} sheet={sheet} path={`${side}.${field.name}`} field={field} />)}
      </div>
    </fieldset>
  )
}

/** Anything larger than a number, with a button that keeps it as a whole. */
function KeptForm({ sheet, path, field }: { sheet: SheetViewProps; path: string; field: Field }) {
  const { method, run, readings, typed, type, locked } = sheet
  const kept = counting(readings).findLast((reading) => reading.path === path)?.value ?? (path.startsWith('parameters.') ? run.parameters[field.name] : undefined)
  const text = typed[path] ?? ''
  const value = text === '' ? kept : typedValue(text)
  const wrong = text === '' ? null : checkEntry(method, path, value)
  return (
    <div className="col-span-full grid gap-3">
      <SchemaFields fields={[field]} value={value === undefined ? {} : { [field.name]: value }} readOnly={Boolean(locked)} onValue={(next) => type({ [path]: next[field.name] === undefined ? '' : JSON.stringify(next[field.name]) })} />
      {text !== '' && !locked && <div><Button size="big" refusal={wrong} onClick={() => keepNamed(sheet, path, value)}>Keep {field.label.toLowerCase()}</Button></div>}
    </div>
  )
}
