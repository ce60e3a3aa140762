import type { ReactNode } from 'react'
import type { EquipmentState } from '../../../shared/api/benches.ts'
import type { Traveller } from '../../../shared/api/basics.ts'
import type { Piece } from '../../../shared/method/piece.ts'
import { sizeText } from '../../../shared/orders/size-text.ts'
import { formatDay, formatTime, isSameDay } from '../../lib/format.ts'
import { Icon } from '../ui/icon.tsx'
import { TravellerLine } from '../ui/traveller/traveller-line.tsx'

export type SheetSample = { number: string; material: string; heat: string; lot: string; piece: Piece; traveller: Traveller }

/** Which sample beyond doubt, what is done to it and by what rules, on which machine, and how far the sample is. */
export function SheetHead({ sample: { number, material, heat, lot, piece, traveller }, title, summary, lines, equipment, zone }: { sample: SheetSample; title: string; summary?: string; lines?: ReactNode; equipment: EquipmentState | null; zone: string }) {
  return (
    <header className="grid grid-cols-[minmax(0,1fr)_auto] gap-x-8 gap-y-3.5 border-b border-line px-10 pt-5 pb-4 max-desk:gap-x-6 max-desk:px-gutter max-desk:pt-4 max-tablet:grid-cols-1">
      <div>
        <h1 className="font-mono text-34 font-medium tracking-[-.045em]">{number}</h1>
        <p className="flex flex-wrap gap-x-4 text-15 text-quiet">
          <span>{[material, `${piece.form} ${sizeText(piece)}`.trim()].filter(Boolean).join(', ')}</span>
          {heat && <span className="whitespace-nowrap">heat <span className="mono">{heat}</span></span>}
          {lot && <span className="whitespace-nowrap">lot <span className="mono">{lot}</span></span>}
        </p>
      </div>
      <div className="text-right text-15 text-quiet max-tablet:text-left">
        <p className="text-20 font-medium text-ink">{title}</p>
        {summary && <p>{summary}</p>}
        {equipment && <Machine equipment={equipment} zone={zone} />}
        {lines}
      </div>
      <TravellerLine nodes={traveller} size="m" times={false} className="col-span-full" />
    </header>
  )
}

/** What the machine is good for today: verified when and with what, or why not. */
export function Machine({ equipment: { code, lastVerification, calibratedUntil, outOfUse }, zone }: { equipment: EquipmentState; zone: string }) {
  const isOver = calibratedUntil !== null && calibratedUntil < new Date().toISOString().slice(0, 10)
  if (outOfUse) return <p className="text-red"><Icon name="stop" className="mr-1.5 inline align-[-3px]" />{code} is out of use</p>
  if (isOver) return <p className="text-red"><Icon name="stop" className="mr-1.5 inline align-[-3px]" />calibration of {code} ended {formatDay(calibratedUntil, 'full')}</p>
  if (!lastVerification) return <p className="text-amber"><Icon name="warning" className="mr-1.5 inline align-[-3px]" />{code} has not been verified</p>
  const { at, passed, text } = lastVerification
  const when = isSameDay(at, new Date(), zone) ? `today ${formatTime(at, { zone })}` : formatDay(at, 'short', { zone })
  if (!passed) return <p className="text-red"><Icon name="stop" className="mr-1.5 inline align-[-3px]" />{code} failed its verification {when}: {text}</p>
  return (
    <>
      <p><Icon name="check" className="mr-1.5 inline size-3.5! align-[-2px] text-ink" />{code} verified {when}, {text}</p>
      {calibratedUntil && <p className="text-13">calibrated until {formatDay(calibratedUntil, 'full')}</p>}
    </>
  )
}
