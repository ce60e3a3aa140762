import type { Method } from '../../../shared/method/method.ts'
import type { TestRun } from '../../../shared/api/test-runs.ts'
import { Explained } from '../../components/ui/explained/explained.tsx'
import { SymbolText } from '../../components/ui/explained/symbol-text.tsx'
import { LimitRule, limitText } from '../../components/ui/limits/limit-rule.tsx'
import { Met } from '../../components/ui/limits/met.tsx'
import type { Live } from '../sheet-view.ts'
import { figureOf } from './figure-of.ts'

/** Several results of one run, each with its limit and where it comes from; limits without a result wait for theirs. */
export function ResultList({ method, run: { requirement }, live, keys }: { method: Method; run: Pick<TestRun, 'requirement'>; live: Live; keys: readonly string[] }) {
  const limits = requirement?.limits ?? []
  const shown = method.resultNames.filter(({ key }) => limits.some((limit) => limit.key === key) || (keys.includes(key) && live.results.some((result) => result.key === key)))
  return (
    <>
      {live.failure && <p role="alert" className="mb-3 text-15 text-red">{live.failure}</p>}
      <ol className="mb-2.5 border-b border-line max-desk:grid max-desk:grid-cols-2 max-desk:gap-x-8">
        {shown.map((name, place) => {
          const result = live.results.find(({ key }) => key === name.key)
          const limit = limits.find(({ key }) => key === name.key)
          const { figure, unit } = result ? figureOf(result.reported) : { figure: '–', unit: name.unit }
          return (
            <li key={name.key} className={`relative border-t py-2 ${place === 0 ? 'border-ink' : 'border-line'}`}>
              <Row symbol={result?.symbol ?? name.symbol} name={name.name} figure={figure} unit={unit} result={result} live={live} requirement={requirement} />
              {limit && (
                <div className="grid grid-cols-[minmax(0,1fr)_100px] items-center gap-3">
                  <LimitRule thin value={result?.value} lower={limit.lower} upper={limit.upper} uncertainty={result?.expandedUncertainty} unit={unit} decimals={name.decimals} />
                  <span className="text-right text-13 text-quiet">{limitText(limit.lower, limit.upper, name.decimals)}</span>
                </div>
              )}
            </li>
          )
        })}
      </ol>
      {live.verdict && <p className="mb-4 text-15 font-medium"><Met outcome={live.verdict.outcome}>{verdictWords(live.verdict)}</Met></p>}
    </>
  )
}

type RowProps = { symbol: string; name: string; figure: string; unit: string; result: Live['results'][number] | undefined; live: Live; requirement: TestRun['requirement'] }

function Row({ symbol, name, figure, unit, result, live, requirement }: RowProps) {
  const line = (
    <>
      <span className="text-17"><SymbolText>{symbol}</SymbolText></span>
      <span className="text-13 text-quiet">{name}</span>
      <span className="text-right text-26 tracking-tight">{figure}</span>
      <span className="unit text-13">{unit}</span>
    </>
  )
  const look = 'grid w-full min-h-7 grid-cols-[82px_minmax(0,1fr)_auto_38px] items-baseline gap-x-1.5 text-left'
  return result ? <Explained result={result} verdict={live.verdict} {...(requirement && { requirement })} className={look}>{line}</Explained> : <span className={`${look} text-quiet`}>{line}</span>
}

function verdictWords({ outcome, limits, rule }: NonNullable<Live['verdict']>): string {
  const guarded = rule === 'guarded' ? ', guarded by U' : ''
  const failed = limits.filter((limit) => limit.outcome === 'fail').length
  const open = limits.filter((limit) => limit.outcome === 'undecided').length
  if (outcome === 'pass') return limits.length === 1 ? `Would meet its limit${guarded}` : `Would meet all ${limits.length} limits${guarded}`
  if (outcome === 'fail') return `Does not meet ${failed} of ${limits.length} limits${guarded}`
  return `${open} of ${limits.length} limits ${open === 1 ? 'is' : 'are'} not decided yet${guarded}`
}
