import type { ReactNode } from 'react'
import type { Method, Outcome } from '../../../shared/method/method.ts'
import type { TestRun } from '../../../shared/api/test-runs.ts'
import { Explained } from '../../components/ui/explained/explained.tsx'
import { LimitRule, limitText } from '../../components/ui/limits/limit-rule.tsx'
import { Met } from '../../components/ui/limits/met.tsx'
import { formatNumber } from '../../lib/format.ts'
import type { Live } from '../sheet-view.ts'
import { figureOf } from './figure-of.ts'

const words: Record<Outcome, string> = { pass: 'Would meet', fail: 'Does not meet', undecided: 'Undecided against' }

/** The one number that is looked at from arm's length, its uncertainty, its place between the limits and what they say to it. */
export function BigResult({ method, run: { requirement }, live, title, under, ticks, bad }: {
  method: Method
  run: Pick<TestRun, 'requirement'>
  live: Live
  title: ReactNode
  /** A line under the number: what it is good to. */
  under?: ReactNode
  /** Readings of the same unit, as ticks on the limit rule. */
  ticks?: readonly number[]
  bad?: readonly number[]
}) {
  const name = method.resultNames.find(({ key }) => key === method.mainResult)
  const result = live.results.find(({ key }) => key === method.mainResult)
  const limit = requirement?.limits.find(({ key }) => key === method.mainResult)
  const outcome = live.verdict?.limits.find(({ key }) => key === method.mainResult)?.outcome
  const figure = result ? figureOf(result.reported) : undefined
  const unit = figure?.unit ?? ''
  return (
    <section aria-label={name?.name ?? 'Result'} className="max-desk:grid max-desk:grid-cols-[250px_minmax(0,1fr)] max-desk:gap-x-8">
      <div>
        <p className="text-15">{title}</p>
        {result ? (
          <Explained result={result} verdict={live.verdict} {...(requirement && { requirement })} className="-ml-0.75 block text-left text-64 tracking-[-.035em] whitespace-nowrap">
            {figure?.figure}<span className="ml-2.5 text-20 tracking-normal text-quiet">{unit}</span>
          </Explained>
        ) : <p className="-ml-0.75 text-64 text-quiet" aria-label="no result yet">–</p>}
        <p className="mb-3.5 min-h-5 text-15 text-quiet">{live.failure ? <span className="text-red">{live.failure}</span> : under ?? (result?.expandedUncertainty !== undefined ? `± ${formatNumber(Number(result.expandedUncertainty.toPrecision(2)))} ${unit}, k = ${formatNumber(Number((result.coverageFactor ?? 2).toPrecision(2)))}` : '')}</p>
      </div>
      {limit && (
        <div className="max-desk:self-end">
          <LimitRule value={result?.value} lower={limit.lower} upper={limit.upper} uncertainty={result?.expandedUncertainty} readings={ticks} bad={bad} unit={unit} decimals={name?.decimals} />
          <p className="mt-1 mb-5 text-15 font-medium">
            {outcome && result ? <Met outcome={outcome}>{words[outcome]} {limitText(limit.lower, limit.upper, name?.decimals)} {unit}{requirement?.rule === 'guarded' ? ', guarded by U' : ''}</Met>
              : <span className="font-normal text-quiet">Asked for: {limitText(limit.lower, limit.upper, name?.decimals)} {name?.unit}</span>}
          </p>
        </div>
      )}
    </section>
  )
}
