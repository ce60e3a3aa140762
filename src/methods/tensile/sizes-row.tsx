import { proportionalGaugeLength } from '../../../shared/tensile/plan/test-piece.ts'
import { Section } from '../../../shared/tensile/tensile-parameters.ts'
import { tensileStandards } from '../../../shared/tensile/tensile-parameters.ts'
import { formatNumber } from '../../lib/format.ts'
import { counting } from '../../lib/kept-readings/sheet-readings.ts'
import { KeptNumber } from '../named/kept-number.tsx'
import { KeptNumbers } from '../named/kept-numbers.tsx'
import type { SheetViewProps } from '../sheet-view.ts'

const section = 'parameters.section'

/** The sizes of the test piece before and after: what is measured by hand, in the order it is measured. */
export function SizesRow({ sheet }: { sheet: SheetViewProps }) {
  const { run, readings, live } = sheet
  const ordered = Section.safeParse(run.parameters['section']).data
  const measured = Section.safeParse(counting(readings).findLast(({ path }) => path === section)?.value).data
  const now = Section.safeParse(live.parameters['section']).data ?? ordered
  const shape = measured?.shape ?? ordered?.shape ?? 'round'
  const standard = tensileStandards.find((one) => one === run.parameters['standard']) ?? 'ISO 6892-1'
  const usual = now && measured ? `usual ${formatNumber(proportionalGaugeLength(now, standard))}` : undefined
  return (
    <div className="mb-4 grid grid-cols-[repeat(auto-fit,minmax(140px,1fr))] items-start gap-x-4 gap-y-3 [&>*:first-child]:col-span-2">
      {shape === 'round' && <Several sheet={sheet} list="diametersMm" label="Diameter, three places" each="Diameter" />}
      {shape === 'rectangular' && <Several sheet={sheet} list="thicknessesMm" label="Thickness, three places" each="Thickness" />}
      {shape === 'rectangular' && <Several sheet={sheet} list="widthsMm" label="Width, three places" each="Width" />}
      {shape === 'area' && (
        <KeptNumbers sheet={sheet} path={section} label="Area" each="Area" unit="mm²" step={0.01} count={1} numbersOf={(kept) => areaOf(kept)} valueOf={([areaMm2]) => ({ shape: 'area', areaMm2 })} />
      )}
      <KeptNumber sheet={sheet} path="parameters.originalGaugeLengthMm" label={<>L<sub>0</sub></>} aside={usual} unit="mm" step={0.1} />
      <KeptNumber sheet={sheet} path="parameters.extensometerGaugeLengthMm" label={<>L<sub>e</sub></>} aside="extensometer" unit="mm" step={0.1} />
      <KeptNumber sheet={sheet} path="readings.finalGaugeLengthMm" label={<>L<sub>u</sub> after the pull</>} unit="mm" step={0.01} />
      {shape === 'rectangular' ? (
        <>
          <KeptNumber sheet={sheet} path="readings.finalThicknessMm" label={<>a<sub>u</sub> at the neck</>} unit="mm" step={0.01} />
          <KeptNumber sheet={sheet} path="readings.finalWidthMm" label={<>b<sub>u</sub> at the neck</>} unit="mm" step={0.01} />
        </>
      ) : (
        <KeptNumbers sheet={sheet} path="readings.finalDiametersMm" label={<>d<sub>u</sub> at the neck</>} each="Diameter at the neck" unit="mm" step={0.01} count={1} numbersOf={numbers} valueOf={(all) => all} />
      )}
      <KeptNumber sheet={sheet} path="readings.fractureFromNearerMarkMm" label="Fracture to mark" aside="if near" unit="mm" step={0.1} />
    </div>
  )
}

type List = 'diametersMm' | 'thicknessesMm' | 'widthsMm'

/** One list of the section; thicknesses and widths are kept together, so each keeps what the other had, measured or ordered. */
function Several({ sheet, list, label, each }: { sheet: SheetViewProps; list: List; label: string; each: string }) {
  const before = Section.safeParse(sheet.run.parameters['section']).data
  const nominal = listOf(before, list)
  const half = Section.safeParse(parsed(sheet.typed[section])).data
  const rest = (kept: unknown) => ({ ...before, ...Section.safeParse(kept).data, ...half })
  return (
    <KeptNumbers
      sheet={sheet} path={section} name={list} label={label} each={each} unit="mm" step={0.001} count={3}
      numbersOf={(kept) => listOf(Section.safeParse(kept).data, list)} valueOf={(all, kept) => ({ ...rest(kept), [list]: all })}
      unkept={nominal.length > 0 ? `not measured yet: the ordered ${nominal.map((one) => formatNumber(one)).join(', ')} mm counts` : undefined}
    />
  )
}

function listOf(found: Section | undefined, list: List): readonly number[] {
  if (found?.shape === 'round') return list === 'diametersMm' ? found.diametersMm : []
  if (found?.shape === 'rectangular') return list === 'thicknessesMm' ? found.thicknessesMm : list === 'widthsMm' ? found.widthsMm : []
  return []
}

function areaOf(kept: unknown): readonly number[] {
  const found = Section.safeParse(kept).data
  return found?.shape === 'area' ? [found.areaMm2] : []
}

function numbers(kept: unknown): readonly number[] {
  return Array.isArray(kept) ? kept.filter((one) => typeof one === 'number') : []
}

function parsed(text: string | undefined): unknown {
  try {
    return JSON.parse(text ?? 'null') as unknown
  } catch {
    return null
  }
}
