import type { TestRun } from '../../../shared/api/test-runs.ts'
import { inputOf } from '../../../shared/method/entries.ts'
import { methodOf } from '../../../shared/methods.ts'
import { ConversionsBox } from '../../methods/results/conversions-box.tsx'
import { SymbolText } from '../ui/explained/symbol-text.tsx'
import { SideSection } from '../ui/side-section.tsx'

/** What the same sample gave by other tests, beside this run's result and what published tables make of it. */
export function HeldAgainst({ run }: { run: TestRun }) {
  const method = methodOf(run.methodId)
  const main = run.evaluation?.results.find(({ key }) => key === method?.mainResult)
  const { parameters } = inputOf(run.parameters, run.readings.filter(({ struck }) => !struck), method?.isSet ?? true)
  const conversions = run.evaluation && method?.conversions ? method.conversions({ parameters, results: run.evaluation.results }) : []
  return (
    <SideSection className="mb-6.5" title="Held against each other">
      <dl>
        {main && <Line name={`This run, ${method?.label(parameters) ?? ''}`} symbol={main.symbol} reported={main.reported} />}
        {run.sameSample.map((other) => <Line key={`${other.label}${other.key}`} name={`${other.label}, same sample`} symbol={other.symbol} reported={other.reported} />)}
      </dl>
      {run.sameSample.length === 0 && <p className="mt-1 text-13 text-quiet">No other test of this sample has been recorded yet.</p>}
      {conversions.length > 0 && <div className="mt-4"><ConversionsBox conversions={conversions} /></div>}
    </SideSection>
  )
}

function Line({ name, symbol, reported }: { name: string; symbol: string; reported: string }) {
  return (
    <div className="flex justify-between gap-4 border-t border-line py-1.5 first:border-0 first:pt-0">
      <dt>{name}</dt>
      <dd className="text-right whitespace-nowrap">{!reported.includes(symbol) && <><SymbolText>{symbol}</SymbolText> </>}<b>{reported}</b></dd>
    </div>
  )
}
