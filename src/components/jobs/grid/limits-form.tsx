import { useState } from 'react'
import type { Requirement } from '../../../../shared/api/orders.ts'
import type { ResultName } from '../../../../shared/method/method.ts'
import { Button } from '../../ui/buttons/button.tsx'
import { SymbolText } from '../../ui/explained/symbol-text.tsx'
import { NumberField } from '../../ui/fields/number-field.tsx'
import { FieldError } from '../../ui/fields/field.tsx'
import { RadioGroup } from '../../ui/fields/radio-group.tsx'

type Limit = Requirement['limits'][number]

/** The limits that results have to keep, and how they are decided on. Only limits that make sense are handed on. */
export function LimitsForm({ names, mainResult, value, onValue }: { names: readonly ResultName[]; mainResult: string; value: Requirement | null; onValue: (value: Requirement | null) => void }) {
  const [limits, setLimits] = useState<readonly Limit[]>(value?.limits ?? [])
  const [all, setAll] = useState(false)
  const rule = value?.rule ?? 'simple'
  const wrong = limits.find(({ lower, upper }) => lower !== undefined && upper !== undefined && lower > upper)
  const give = (next: readonly Limit[], by: Requirement['rule'] = rule) => {
    setLimits(next)
    const set = next.filter(({ lower, upper }) => lower !== undefined || upper !== undefined)
    if (set.some(({ lower, upper }) => lower !== undefined && upper !== undefined && lower > upper)) return
    onValue(set.length > 0 ? { limits: set.map(({ key, lower, upper }) => ({ key, ...(lower !== undefined && { lower }), ...(upper !== undefined && { upper }) })), rule: by } : null)
  }
  const set = (key: string, change: Partial<Limit>) => give([...limits.filter((limit) => limit.key !== key), { key, ...limits.find((limit) => limit.key === key), ...change }])
  const shown = all || names.length <= 3 ? names : names.filter(({ key }) => key === mainResult || limits.some((limit) => limit.key === key))
  return (
    <fieldset className="min-w-0">
      <legend className="mb-1 text-13 font-medium">Limits <span className="font-normal text-quiet">if any</span></legend>
      <div className="grid gap-2">
        {shown.map(({ key, symbol, name, unit, decimals }) => {
          const limit = limits.find((one) => one.key === key)
          return (
            <div key={key} className="grid grid-cols-[minmax(0,1fr)_112px_112px] items-center gap-2">
              <span className="text-13 leading-tight"><SymbolText>{symbol}</SymbolText> <span className="text-quiet">{name}</span></span>
              <NumberField label={`${name}, lowest`} labelHidden placeholder="from" unit={unit} step={10 ** -decimals} value={limit?.lower} onValue={(lower) => set(key, { lower })} arrows={false} />
              <NumberField label={`${name}, highest`} labelHidden placeholder="to" unit={unit} step={10 ** -decimals} value={limit?.upper} onValue={(upper) => set(key, { upper })} arrows={false} />
            </div>
          )
        })}
      </div>
      {wrong && <FieldError>The lower limit is above the upper; until that is put right the limits stay as they were.</FieldError>}
      {shown.length < names.length && <Button size="tiny" kind="bare" className="mt-1 -ml-2" onClick={() => setAll(true)}>Limits on other results</Button>}
      {limits.length > 0 && (
        <RadioGroup
          className="mt-3" legend="Decided by" value={rule} onValue={(next) => give(limits, next === 'guarded' ? 'guarded' : 'simple')}
          choices={[
            { value: 'simple', label: 'the result alone', hint: 'simple acceptance: inside the limits is met' },
            { value: 'guarded', label: 'the result with its uncertainty', hint: 'guarded acceptance: limits are drawn in by U' },
          ]}
        />
      )}
    </fieldset>
  )
}
