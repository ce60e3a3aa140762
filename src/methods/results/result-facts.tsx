import type { Method } from '../../../shared/method/method.ts'
import type { TestRun } from '../../../shared/api/test-runs.ts'
import { Explained } from '../../components/ui/explained/explained.tsx'
import { Pairs } from '../../components/ui/pairs.tsx'
import type { Live } from '../sheet-view.ts'

/** Every other result with where it comes from, and what the same sample gave by other tests. */
export function ResultFacts({ method, run: { sameSample }, live, except = [method.mainResult] }: { method: Method; run: Pick<TestRun, 'sameSample'>; live: Live; except?: readonly string[] }) {
  const rest = live.results.filter(({ key }) => !except.includes(key))
  const items = [
    ...rest.map((result) => [nameOf(method, result.key), <Explained key={result.key} result={result} verdict={live.verdict} className="whitespace-nowrap" />] as const),
    ...sameSample.map((other) => [`${other.label}, same sample`, other.reported] as const),
  ]
  return items.length > 0 ? <Pairs look="ruled" items={items} className="mb-5 text-15 [&_dd]:text-17" /> : null
}

/** "Standard deviation" */
export function nameOf(method: Method, key: string): string {
  const name = method.resultNames.find((one) => one.key === key)?.name ?? key
  return name.charAt(0).toUpperCase() + name.slice(1)
}
