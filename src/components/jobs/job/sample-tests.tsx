import type { ReactNode } from 'react'
import type { SampleInJob } from '../../../../shared/api/jobs.ts'
import { methodOf } from '../../../../shared/methods.ts'
import { formatNumber } from '../../../lib/format.ts'
import { SymbolText } from '../../ui/explained/symbol-text.tsx'
import { State } from '../../ui/traveller/state.tsx'

type TestInJob = SampleInJob['tests'][number]

/** The tests of a sample with their states, their limits, and the main result once it is accepted. `links` leads on, for those who may. */
export function SampleTests({ tests, links, className }: { tests: readonly TestInJob[]; links?: (test: TestInJob) => ReactNode; className?: string }) {
  return (
    <ul className={className}>
      {tests.map((test) => (
        <li key={test.id} className="flex flex-wrap items-center gap-x-5 gap-y-0.5 py-1 text-13">
          <span className="min-w-40 font-medium" title={test.summary}>{test.label}</span>
          <State state={test.state} className="text-13 text-quiet" />
          <span className="text-quiet">{limitsOf(test)}</span>
          {test.mainResult && <span className="ml-auto text-15"><SymbolText>{test.mainResult.symbol}</SymbolText> <b>{test.mainResult.reported}</b></span>}
          {links?.(test)}
        </li>
      ))}
    </ul>
  )
}

/** "29 to 34 HR", "Rm 850 MPa or more, A 12 % or more"; empty without limits. */
export function limitsOf({ methodId, requirement }: Pick<TestInJob, 'methodId' | 'requirement'>): string {
  const names = methodOf(methodId)?.resultNames ?? []
  const words = (requirement?.limits ?? []).map(({ key, lower, upper }) => {
    const name = names.find((one) => one.key === key)
    const unit = name?.unit ? ` ${name.unit}` : ''
    const symbol = name && name.unit === name.symbol ? '' : `${name?.symbol ?? key} `
    const say = (limit: number) => formatNumber(limit)
    if (lower !== undefined && upper !== undefined) return `${symbol}${say(lower)} to ${say(upper)}${unit}`
    return lower !== undefined ? `${symbol}${say(lower)}${unit} or more` : `${symbol}at most ${say(upper ?? 0)}${unit}`
  })
  return words.length > 0 ? `${words.join(', ')}${requirement?.rule === 'guarded' ? ', guarded' : ''}` : ''
}
