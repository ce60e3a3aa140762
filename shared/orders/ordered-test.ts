import type { Order, OrderColumn, OrderSample } from '../api/orders.ts'
import type { Method } from '../method/method.ts'
import { orderedParameters } from '../method/ordered-parameters.ts'
import { methodOf } from '../methods.ts'

/** One test of one sample, as ordered. `parameters` are checked and complete, or the reason why they are not. */
export type OrderedTest = { column: OrderColumn; method: Method | null; label: string } & (
  | { parameters: Record<string, unknown>; issues: null }
  | { parameters: null; issues: readonly { field: string; message: string }[] }
)

/** The tests ticked for a sample, in the order of the columns. */
export function orderedTests(order: Pick<Order, 'columns'>, sample: OrderSample): OrderedTest[] {
  return order.columns.filter(({ key }) => sample.tests.includes(key)).map((column) => orderedTest(column, sample.overrides[column.key]))
}

/** A column's test, for a sample that may differ in some parameters. */
export function orderedTest(column: OrderColumn, override: Record<string, unknown> = {}): OrderedTest {
  const method = methodOf(column.methodId) ?? null
  if (!method) return { column, method, label: column.methodId, parameters: null, issues: [{ field: 'methodId', message: `there is no method "${column.methodId}"` }] }
  const parsed = orderedParameters(method.parameters, method.measured).safeParse({ ...column.parameters, ...override })
  if (!parsed.success) {
    const issues = parsed.error.issues.map(({ path, message }) => ({ field: path.join('.'), message }))
    return { column, method, label: method.title, parameters: null, issues }
  }
  const parameters = isRecord(parsed.data) ? parsed.data : {}
  return { column, method, label: method.label(parameters), parameters, issues: null }
}

const isRecord = (value: unknown): value is Record<string, unknown> => typeof value === 'object' && value !== null && !Array.isArray(value)
