import type { DerivationStep, Requirement, Result, UncertaintyComponent, Verdict } from '../../../../shared/method/method.ts'
import { formatNumber } from '../../../lib/format.ts'
import { LimitRule, limitText } from '../limits/limit-rule.tsx'
import { Met } from '../limits/met.tsx'
import { SymbolText } from './symbol-text.tsx'

export type DerivationProps = {
  result: Result
  /** Contributions to the uncertainty, where the laboratory has stated them. */
  budget?: readonly UncertaintyComponent[]
  requirement?: Requirement
  verdict?: Verdict
}

/** Where a number comes from: reading, formula with its values put in, rounding, uncertainty, decision, each with its clause. */
export function Derivation({ result, budget = [], requirement, verdict }: DerivationProps) {
  const limit = verdict?.limits.find((one) => one.key === result.key) ?? requirement?.limits.find((one) => one.key === result.key)
  const outcome = verdict?.limits.find((one) => one.key === result.key)
  const [figure, ...unit] = result.reported.split(' ')
  return (
    <div className="text-[0.875rem]/5">
      <p className="mb-1.5 flex flex-wrap items-baseline gap-x-2 text-26 leading-12!">
        <span><SymbolText>{result.symbol}</SymbolText></span>
        <b className="text-[2.875rem]/12 font-normal tracking-[-.03em]">{figure}</b>
        <span className="text-17 text-quiet">{unit.join(' ')}</span>
      </p>
      {result.approximate && <p className="mb-3 font-medium text-amber">Approximate: carried over by a table, never for acceptance unless agreed.</p>}
      <ol className="border-t border-ink">
        {result.derivation.map((step, place) => <Step key={place} step={step} number={place + 1} />)}
      </ol>
      {result.expandedUncertainty !== undefined && <Uncertainty result={result} budget={budget} />}
      {limit && (
        <section className="mt-3 border-t border-ink pt-2">
          <p><b className="font-bold">Decision</b> <span className="text-12 text-quiet">{(requirement?.rule ?? verdict?.rule) === 'guarded' ? 'guarded: limit moved inwards by U' : 'simple: result against the limit'}, agreed with the customer</span></p>
          <LimitRule value={result.value} uncertainty={result.expandedUncertainty} lower={limit.lower} upper={limit.upper} unit={result.unit} className="mt-1" />
          {outcome && (
            <p className="flex flex-wrap items-center justify-between gap-x-3">
              <Met outcome={outcome.outcome}>{outcomeWords[outcome.outcome]} {limitText(limit.lower, limit.upper, undefined, result.unit)}</Met>
              {outcome.probabilityOfConformity !== undefined && <span className="text-12 text-quiet">probability {percent(outcome.probabilityOfConformity)}</span>}
            </p>
          )}
        </section>
      )}
    </div>
  )
}

const outcomeWords = { pass: 'Meets', fail: 'Does not meet', undecided: 'Undecided against' }

function Step({ step, number }: { step: DerivationStep; number: number }) {
  const value = step.reported ?? (step.value === undefined ? undefined : `${formatNumber(Number(step.value.toPrecision(6)))}${step.unit ? ` ${step.unit}` : ''}`)
  return (
    <li className="grid grid-cols-[22px_minmax(0,1fr)_auto] gap-x-2 border-b border-line py-2">
      <span className="text-13 text-quiet" aria-hidden>{number}</span>
      <span className="break-words">{step.text}</span>
      <span className="font-medium whitespace-nowrap">{value}</span>
      {step.formula && <span className="col-start-2 break-words text-[0.84375rem]/6">{step.formula}</span>}
      {step.clause && <span className="col-start-2 col-end-4 text-12 text-quiet">{step.clause}</span>}
    </li>
  )
}

function Uncertainty({ result, budget }: { result: Result; budget: readonly UncertaintyComponent[] }) {
  const parts = budget.map((one) => ({ name: one.name, size: Math.abs(one.standardUncertainty * (one.sensitivity ?? 1)) }))
  const largest = Math.max(...parts.map((part) => part.size), Number.MIN_VALUE)
  return (
    <section className="mt-0.5 border-t border-ink pt-2">
      <p className="flex justify-between gap-3">
        <span><b className="font-bold">Uncertainty</b> <span className="text-12 text-quiet">GUM, k = {formatNumber(Number((result.coverageFactor ?? 2).toPrecision(3)))}</span></span>
        <span className="font-medium">± {formatNumber(Number((result.expandedUncertainty ?? 0).toPrecision(2)))} {result.unit}</span>
      </p>
      {parts.length > 0 && (
        <ul className="my-1.5">
          {parts.map((part) => (
            <li key={part.name} className="grid grid-cols-[140px_1fr_48px] items-center gap-2.5 text-13">
              <span className="break-words">{part.name}</span>
              <i aria-hidden className="h-1.5"><span className="block h-1.5 w-[calc(var(--share)*1%)] bg-edge" style={{ '--share': (100 * part.size) / largest }} /></i>
              <span className="text-right">{formatNumber(Number(part.size.toPrecision(3)))}</span>
            </li>
          ))}
        </ul>
      )}
    </section>
  )
}

function percent(probability: number): string {
  if (probability > 0.999) return 'above 99.9 %'
  if (probability < 0.001) return 'below 0.1 %'
  return `${formatNumber(probability * 100, 1)} %`
}
