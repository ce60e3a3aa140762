import { temperOf } from '../ui/traveller/temper.ts'

const stages = ['placed', 'awaiting samples', 'in work'] as const

/** What the floor's colours and hatchings mean. */
export function FloorLegend() {
  return (
    <ul className="mb-4 flex flex-wrap gap-x-5.5 gap-y-1 text-13 text-quiet">
      {stages.map((stage) => <li key={stage} className={`c-${temperOf(stage)} flex items-center gap-2`}><i aria-hidden className="size-3 border-[1.5px] border-(--ce) bg-(--c)" />{stage}</li>)}
      <li className="c-bronze flex items-center gap-2"><i aria-hidden className="h-3 w-5.5 border border-(--ce) bg-(--c)" />done or running</li>
      <li className="c-bronze flex items-center gap-2"><i aria-hidden className="h-3 w-5.5 border border-l-4 border-edge border-l-(--c) bg-sheet" />planned</li>
      <li className="flex items-center gap-2"><i aria-hidden className="h-3 w-5.5 border border-line bg-shut" />shut</li>
      <li className="flex items-center gap-2"><i aria-hidden className="h-3 w-5.5 border border-line [background:var(--hatch)]" />out of use</li>
    </ul>
  )
}
