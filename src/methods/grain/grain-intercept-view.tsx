import { formFields } from '../../../shared/method/form.ts'
import { grainRules, grainSizeNumber, grainStandards } from '../../../shared/grain/grain-size-number.ts'
import { RadioGroup } from '../../components/ui/fields/radio-group.tsx'
import { formatNumber } from '../../lib/format.ts'
import type { SheetViewProps } from '../sheet-view.ts'
import type { GridColumn } from '../set/grid-column.ts'
import { plural, SetView } from '../set/set-view.tsx'
import { fieldsWanted } from './fields-wanted.ts'

type Counted = { lineLengthMm: number; intersections?: number; intercepts?: number }

/** Counts field by field: G as it grows, how sure it is, and how many more fields make it sure enough. */
export function GrainInterceptView(sheet: SheetViewProps) {
  const { method, live, typed, type } = sheet
  const fields = (Array.isArray(live.readings) ? live.readings : []) as readonly Counted[]
  const standard = grainStandards.find((one) => one === live.parameters['standard']) ?? grainStandards[0]
  const kept = fields.find((field) => field.intercepts !== undefined || field.intersections !== undefined)
  const what = kept ? (kept.intercepts === undefined ? 'intersections' : 'intercepts') : typed['what'] === 'intercepts' ? 'intercepts' : 'intersections'
  const columns = formFields(method.readings).flatMap((field): GridColumn[] => {
    if (field.kind !== 'number') return []
    if (field.name === 'lineLengthMm') return [{ field, head: 'Line', unit: 'mm', decimals: 3 }]
    return field.name === what ? [{ field: { ...field, optional: false }, head: what === 'intersections' ? 'Crossed' : 'Grains cut' }] : []
  }).reverse()
  const perMm = (field: Partial<Counted>) => {
    const count = field.intersections ?? field.intercepts
    return count !== undefined && field.lineLengthMm ? count / field.lineLengthMm : undefined
  }
  const accuracy = live.results.find(({ key }) => key === 'relativeAccuracy')
  const interval = live.results.find(({ key }) => key === 'confidence95')
  const total = fields.reduce((sum, field) => sum + (field.intersections ?? field.intercepts ?? 0), 0)
  const wanted = accuracy && fieldsWanted(fields.flatMap((field) => perMm(field) ?? []), 10)
  return (
    <SetView
      sheet={sheet} rowName="Field" columns={columns} carry={['lineLengthMm']}
      more={[
        { head: <>N<sub>L</sub></>, unit: '1/mm', cell: (field) => show(perMm(field), 1) },
        { head: 'G', cell: (field) => { const count = perMm(field); return count ? formatNumber(grainSizeNumber(count, standard), 1) : '' } },
      ]}
      title={`Grain size, ${fields.length} ${plural('field', fields.length)}, ${formatNumber(total)} counts`}
      under={interval ? `${interval.reported}, 95 % confidence; relative accuracy ${accuracy?.reported ?? ''}` : grainRules[standard].edition}
      aside={
        <div className="mb-5 grid gap-4 text-15">
          {wanted !== undefined && <p>{wanted > fields.length ? `About ${wanted - fields.length} more ${plural('field', wanted - fields.length)} for a relative accuracy of 10 %.` : 'The relative accuracy is 10 % or better.'}</p>}
          {!kept && !sheet.locked && (
            <RadioGroup legend="What is counted" name="what" value={what} onValue={(value) => type({ what: value })} choices={[{ value: 'intersections', label: 'Grain boundaries crossed by the line' }, { value: 'intercepts', label: 'Grains cut by the line' }]} />
          )}
        </div>
      }
    />
  )
}

function show(value: number | undefined, decimals: number): string {
  return value === undefined ? '' : formatNumber(value, decimals)
}
