import type { TestRun } from '../../../shared/api/test-runs.ts'
import type { Result } from '../../../shared/method/method.ts'
import { IconButton } from '../ui/buttons/icon-button.tsx'
import { Derivation } from '../ui/explained/derivation.tsx'

/** Where one number comes from, beside the run; below its results on narrower screens. `asked` is false while nobody has chosen one. */
export function ExplainPanel({ run, result, asked, onClose }: { run: TestRun; result: Result; asked: boolean; onClose: () => void }) {
  return (
    <aside aria-label="Where this number comes from" className={`on-sheet bg-sheet wide:col-start-2 wide:row-span-4 wide:row-start-1 wide:border-l wide:border-line max-wide:mx-8 max-wide:mb-6.5 max-wide:border max-wide:border-line max-tablet:mx-gutter ${asked ? '' : 'max-wide:hidden'}`}>
      <div className="px-7 py-4 wide:sticky wide:top-0 wide:max-h-dvh wide:overflow-y-auto wide:pb-6 max-tablet:px-4">
        <div className="-mr-2.5 mb-1 flex items-center justify-between text-13 text-quiet">
          <p>Where this number comes from</p>
          <IconButton icon="cross" label="Close" onClick={onClose} className="text-ink" />
        </div>
        <Derivation result={result} verdict={run.evaluation?.verdict} {...(run.requirement && { requirement: run.requirement })} />
      </div>
    </aside>
  )
}
