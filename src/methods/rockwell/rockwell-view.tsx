import { formFields } from '../../../shared/method/form.ts'
import { RockwellParameters, type RockwellReading } from '../../../shared/hardness/rockwell/rockwell-input.ts'
import type { SheetViewProps } from '../sheet-view.ts'
import type { GridColumn } from '../set/grid-column.ts'
import { counting } from '../../lib/kept-readings/sheet-readings.ts'
import { plural, SetView } from '../set/set-view.tsx'
import { TestPieceMap } from './test-piece-map.tsx'

/** The hardness sheet: readings with their places, a map of the test piece as soon as places are given, the mean large. */
export function RockwellView(sheet: SheetViewProps) {
  const { method, live } = sheet
  const scale = RockwellParameters.safeParse(live.parameters).data?.scale ?? 'HRC'
  const readings = (Array.isArray(live.readings) ? live.readings : []) as readonly RockwellReading[]
  const columns = formFields(method.readings).flatMap((field): GridColumn[] => {
    if (field.kind !== 'number') return []
    if (field.name === 'value') return [{ field, head: scale, decimals: 1 }]
    return [{ field, head: { xMm: 'x', yMm: 'y', edgeMm: 'edge' }[field.name] ?? field.label, unit: field.unit, decimals: 1 }]
  })
  const places = readings.some(({ xMm, yMm }) => xMm !== undefined || yMm !== undefined)
  return (
    <SetView
      sheet={sheet} columns={columns} title={`Mean of ${readings.length} ${plural('reading', readings.length)}${readings.length > counting(sheet.readings).length ? ', one not kept yet' : ''}`} ticks={readings.map(({ value }) => value)}
      picture={places ? <TestPieceMap scale={scale} readings={readings} checks={live.checks} /> : undefined}
    />
  )
}
