import type { TestRun } from '../../../shared/api/test-runs.ts'
import type { Result } from '../../../shared/method/method.ts'
import { methodOf } from '../../../shared/methods.ts'
import { formatNumber } from '../../lib/format.ts'
import { figureOf } from '../../methods/results/figure-of.ts'
import { Explained } from '../ui/explained/explained.tsx'
import { SymbolText } from '../ui/explained/symbol-text.tsx'
import { LimitRule, limitText } from '../ui/limits/limit-rule.tsx'
import { Met } from '../ui/limits/met.tsx'
import { SideSection } from '../ui/side-section.tsx'
import type { Column } from '../ui/table/column.ts'
import { PlainTable } from '../ui/table/plain-table.tsx'

type Limits = NonNullable<TestRun['requirement']>['limits'][number]
type Row = { key: string; symbol: string; name: string; unit: string; decimals: number | undefined; result: Result | undefined; limit: Limits | undefined; outcome: 'pass' | 'fail' | 'undecided' | undefined }

/** Results against their limits; each is a button that shows where it comes from. `explained` is the key of the one shown. */
export function ResultsTable({ run, explained, onExplain }: { run: TestRun; explained: string | undefined; onExplain: (key: string) => void }) {
  const rows = rowsOf(run)
  const hasLimits = rows.some(({ limit }) => limit)
  const hasUncertainty = rows.some(({ result }) => result?.expandedUncertainty !== undefined)
  const columns: Column<Row>[] = [
    {
      id: 'symbol', head: '', name: 'Result', nowrap: true,
      cell: ({ key, symbol, name, result }) => (
        <>
          {result ? <Explained result={result} open={key === explained} onExplain={() => onExplain(key)} className="-my-1 min-h-small underline decoration-edge"><SymbolText>{symbol}</SymbolText></Explained> : <SymbolText>{symbol}</SymbolText>}
          {name !== symbol && <span className="ml-2 text-13 text-quiet max-tablet:hidden">{name}</span>}
        </>
      ),
    },
    { id: 'value', head: 'Value', numeric: true, nowrap: true, cell: ({ result }) => (result ? figureOf(result.reported).figure : <span className="text-quiet">not worked out</span>) },
    ...(hasUncertainty ? [{ id: 'uncertainty', head: '± U', numeric: true, nowrap: true, cell: ({ result }: Row) => (result?.expandedUncertainty === undefined ? '' : formatNumber(Number(result.expandedUncertainty.toPrecision(2)))) }] : []),
    { id: 'unit', head: 'Unit', nowrap: true, cell: ({ result, unit }) => <span className="unit">{result ? figureOf(result.reported).unit : unit}</span> },
    ...(hasLimits ? [
      { id: 'limits', head: 'Requirement', nowrap: true, cell: ({ limit, decimals }: Row) => (limit ? limitText(limit.lower, limit.upper, decimals) : <span className="text-quiet">none</span>) },
      { id: 'rule', head: '', name: 'Place between the limits', share: 24, cell: ({ limit, result, unit, outcome }: Row) => (limit && result ? <LimitRule thin className="min-w-28" value={result.value} lower={limit.lower} upper={limit.upper} uncertainty={result.expandedUncertainty} unit={unit} failed={outcome === 'fail'} /> : '') },
      { id: 'outcome', head: '', name: 'Decision', nowrap: true, cell: ({ outcome }: Row) => outcome && <Met outcome={outcome} /> },
    ] : []),
  ]
  return (
    <SideSection className="mb-6.5" title="Results" aside="choose one to see where it comes from">
      <PlainTable caption="Results" columns={columns} rows={rows} rowId={({ key }) => key} current={explained} className="[&_:is(td,th):first-child]:pl-3 [&_.pick>:first-child]:shadow-[inset_3px_0_var(--ink)]" />
    </SideSection>
  )
}

function rowsOf({ evaluation, methodId, requirement }: TestRun): Row[] {
  const names = methodOf(methodId)?.resultNames ?? []
  const row = (key: string): Row => {
    const name = names.find((one) => one.key === key)
    const result = evaluation?.results.find((one) => one.key === key)
    return {
      key, symbol: result?.symbol ?? name?.symbol ?? key, name: name?.name ?? key, unit: result?.unit ?? name?.unit ?? '', decimals: name?.decimals, result,
      limit: requirement?.limits.find((one) => one.key === key), outcome: evaluation?.verdict?.limits.find((one) => one.key === key)?.outcome,
    }
  }
  const keys = [...(evaluation?.results ?? []), ...(requirement?.limits ?? [])].map(({ key }) => key)
  const limited = new Set(requirement?.limits.map(({ key }) => key))
  return [...new Set(keys)].sort((a, b) => Number(limited.has(b)) - Number(limited.has(a))).map(row)
}
