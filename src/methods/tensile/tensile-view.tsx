import { useMemo } from 'react'
import { tensilePicture } from '../../../shared/tensile/curve.ts'
import { TensileParameters } from '../../../shared/tensile/tensile-parameters.ts'
import { TensileReadings } from '../../../shared/tensile/tensile-readings.ts'
import { counting } from '../../lib/kept-readings/sheet-readings.ts'
import { KeptNumber } from '../named/kept-number.tsx'
import { BrokenRules } from '../results/broken-rules.tsx'
import { ResultFacts } from '../results/result-facts.tsx'
import { ResultList } from '../results/result-list.tsx'
import { SheetColumns } from '../results/sheet-columns.tsx'
import type { Live, SheetViewProps } from '../sheet-view.ts'
import { ElasticPicture } from './elastic-picture.tsx'
import { RecordTaken } from './record-taken.tsx'
import { RecordImport } from './record/record-import.tsx'
import { SizesRow } from './sizes-row.tsx'
import { WholePicture } from './whole-picture.tsx'

const shown = ['proofStrength', 'upperYield', 'lowerYield', 'tensileStrength', 'elongation', 'reductionOfArea', 'extensionAtMaximum', 'yieldRatio']

/** The pull: sizes, the frame's record, the curve with its construction, and what it gives. */
export function TensileView(sheet: SheetViewProps) {
  const { method, run, live, readings, locked } = sheet
  const kept = counting(readings).find(({ path }) => path === 'readings.curve')
  const picture = useMemo(() => pictureOf(live), [live])
  return (
    <SheetColumns
      side="narrow"
      left={
        <>
          <SizesRow sheet={sheet} />
          {picture && (
            <>
              <ElasticPicture picture={picture} sheet={sheet} />
              <WholePicture picture={picture} />
            </>
          )}
          {kept ? <RecordTaken sheet={sheet} reading={kept} /> : !locked && <RecordImport sheet={sheet} />}
          {!kept && <ByHand sheet={sheet} />}
          <BrokenRules sheet={sheet} className="mt-5" />
        </>
      }
      result={<ResultList method={method} run={run} live={live} keys={shown} />}
      more={<ResultFacts method={method} run={run} live={live} except={[...shown, ...(run.requirement?.limits.map(({ key }) => key) ?? [])]} />}
    />
  )
}

function ByHand({ sheet }: { sheet: SheetViewProps }) {
  return (
    <fieldset className="mt-5">
      <legend className="mb-2 w-full border-t border-line pt-2 text-15 font-bold">By hand, where there is no record</legend>
      <div className="grid grid-cols-[repeat(auto-fit,minmax(160px,1fr))] items-start gap-4">
        <KeptNumber sheet={sheet} path="readings.maximumForceN" label={<>Greatest force F<sub>m</sub></>} unit="N" step={1} />
        <KeptNumber sheet={sheet} path="readings.proofForceN" label="At the proof strength" unit="N" step={1} />
        <KeptNumber sheet={sheet} path="readings.upperYieldForceN" label="Upper yield" unit="N" step={1} />
        <KeptNumber sheet={sheet} path="readings.lowerYieldForceN" label="Lower yield" unit="N" step={1} />
      </div>
    </fieldset>
  )
}

/** What the curve shows; null while sizes or record cannot be read, which the results say. */
function pictureOf({ parameters, readings }: Live) {
  const ordered = TensileParameters.safeParse(parameters)
  const read = TensileReadings.safeParse(readings)
  return ordered.success && read.success ? tensilePicture(ordered.data, read.data) : null
}
