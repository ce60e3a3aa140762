import { TensileCurve } from '../../../shared/tensile/tensile-readings.ts'
import { Button } from '../../components/ui/buttons/button.tsx'
import { Icon } from '../../components/ui/icon.tsx'
import { formatNumber, formatTime } from '../../lib/format.ts'
import type { SheetReading } from '../../lib/kept-readings/sheet-readings.ts'
import type { SheetViewProps } from '../sheet-view.ts'

/** The record that is kept: how long it is, and the way to strike it out when it was the wrong one. */
export function RecordTaken({ sheet: { run, locked, strike }, reading }: { sheet: SheetViewProps; reading: SheetReading }) {
  const curve = TensileCurve.safeParse(reading.value).data
  return (
    <p className="flex flex-wrap items-center gap-x-4 gap-y-2 border-t border-line pt-3 text-15">
      <Icon name="attach" className="text-quiet" />
      <span>Record of {formatNumber(curve?.forceN.length ?? 0)} points, kept {formatTime(reading.at, { zone: run.timeZone })}</span>
      {!locked && <Button kind="soft" className="ml-auto" onClick={() => strike(reading.key)}>Strike out the record</Button>}
    </p>
  )
}
