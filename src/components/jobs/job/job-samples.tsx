import { useState } from 'react'
import { Link } from 'react-router-dom'
import type { Job, SampleInJob } from '../../../../shared/api/jobs.ts'
import { sizeText } from '../../../../shared/orders/size-text.ts'
import { Icon } from '../../ui/icon.tsx'
import { classNames } from '../../ui/class-names.ts'
import { Flag } from '../../ui/traveller/flag.tsx'
import { TravellerLine } from '../../ui/traveller/traveller-line.tsx'
import { SampleTests } from './sample-tests.tsx'

const openFirst = 4

/** The samples of a job with their traveller lines: those on hold and the first few in full, the others folded. */
export function JobSamples({ job, mayAnswer }: { job: Job; mayAnswer: boolean }) {
  const [turned, setTurned] = useState<ReadonlySet<string>>(new Set())
  const first = new Set([...job.samples.filter(({ onHold }) => onHold), ...job.samples].slice(0, openFirst).map(({ id }) => id))
  const turn = (id: string) => setTurned((now) => new Set(now.has(id) ? [...now].filter((one) => one !== id) : [...now, id]))
  return (
    <ol>
      {job.samples.map((sample) => {
        const isOpen = first.has(sample.id) !== turned.has(sample.id)
        return isOpen
          ? <OpenSample key={sample.id} sample={sample} zone={job.timeZone} mayAnswer={mayAnswer} onFold={() => turn(sample.id)} />
          : <FoldedSample key={sample.id} sample={sample} onOpen={() => turn(sample.id)} />
      })}
    </ol>
  )
}

function OpenSample({ sample, zone, mayAnswer, onFold }: { sample: SampleInJob; zone: string; mayAnswer: boolean; onFold: () => void }) {
  const { onHold, now } = sample
  return (
    <li className="border-b border-line pt-3.5 pb-5 max-tablet:pb-3">
      <div className="mb-2.5 flex flex-wrap items-baseline gap-x-5 gap-y-1">
        <Name sample={sample} />
        <HeatAndLot sample={sample} />
        <span className="text-quiet max-tablet:hidden">{[sample.material, `${sample.piece.form} ${sizeText(sample.piece)}`.trim()].filter(Boolean).join(', ')}</span>
        <span className={classNames('ml-auto text-right max-tablet:order-1 max-tablet:ml-0 max-tablet:basis-full max-tablet:text-left', !onHold && 'text-quiet')}>{onHold ? <Flag>{mayAnswer ? `${now}: your answer is needed` : now}</Flag> : now}</span>
        <Fold open number={sample.number} onPress={onFold} />
      </div>
      <TravellerLine size="l" nodes={sample.traveller} zone={zone} onPhone={onHold ? 'upright' : 'fold'} />
      <SampleTests tests={sample.tests} className="mt-3" />
    </li>
  )
}

function FoldedSample({ sample, onOpen }: { sample: SampleInJob; onOpen: () => void }) {
  return (
    <li className="grid grid-cols-[52px_minmax(150px,auto)_minmax(0,1fr)_minmax(120px,auto)_28px] items-center gap-x-4 gap-y-1 border-b border-line py-3 max-tablet:grid-cols-[44px_minmax(0,1fr)_28px]">
      <Name sample={sample} />
      <HeatAndLot sample={sample} />
      <span className="max-tablet:order-1 max-tablet:col-span-full"><TravellerLine nodes={sample.traveller} /></span>
      <span className="text-right text-quiet max-tablet:order-2 max-tablet:col-span-full max-tablet:text-left">{sample.onHold ? <Flag>on hold</Flag> : sample.now}</span>
      <Fold number={sample.number} onPress={onOpen} />
    </li>
  )
}

function Name({ sample: { id, number } }: { sample: SampleInJob }) {
  return <Link to={`/samples/${id}`} aria-label={`Sample ${number}`} className="mono text-20 font-medium no-underline hover:underline">{number.slice(number.lastIndexOf('-'))}</Link>
}

function HeatAndLot({ sample: { heat, lot } }: { sample: SampleInJob }) {
  return <span>{heat && <>heat <span className="mono">{heat}</span></>}{heat && lot && ', '}{lot && <>lot <span className="mono">{lot}</span></>}{!heat && !lot && <span className="text-quiet">no heat or lot</span>}</span>
}

function Fold({ open = false, number, onPress }: { open?: boolean; number: string; onPress: () => void }) {
  return (
    <button type="button" aria-expanded={open} aria-label={`Sample ${number}, ${open ? 'fold' : 'open'}`} onClick={onPress} className="grid size-7 place-items-center self-center text-quiet hover:text-ink">
      <Icon name={open ? 'up' : 'down'} />
    </button>
  )
}
