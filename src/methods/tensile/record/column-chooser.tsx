import type { ColumnChoice } from '../../../../shared/tensile/record.ts'
import { SelectField } from '../../../components/ui/fields/select-field.tsx'

/** Which column of the record holds something, and in which unit. */
export function ColumnChooser<U extends string>({ label, names, units, value, onValue, isOptional = false }: { label: string; names: readonly string[]; units: Readonly<Record<U, number>>; value: ColumnChoice<U>; onValue: (value: ColumnChoice<U>) => void; isOptional?: boolean }) {
  const known = Object.keys(units) as U[]
  return (
    <div className="grid grid-cols-[minmax(0,1fr)_92px] gap-2">
      <SelectField label={label} aside={isOptional ? 'if any' : undefined} empty={isOptional ? 'none' : 'choose'} value={names.includes(value.column) ? value.column : ''} choices={names.map((name) => ({ value: name, label: name }))} onChange={(event) => onValue({ ...value, column: event.target.value })} />
      <SelectField label={`Unit of the ${label.toLowerCase()}`} labelHidden className="pt-5.5" value={value.unit} choices={known.map((unit) => ({ value: unit, label: unit }))} onChange={(event) => onValue({ ...value, unit: known.find((unit) => unit === event.target.value) ?? value.unit })} />
    </div>
  )
}
