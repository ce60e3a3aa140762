import type { MethodOffer } from '../api/evaluations.ts'
import type { Order, OrderColumn, OrderFault, OrderSample } from '../api/orders.ts'
import { orderedTest, orderedTests, type OrderedTest } from './ordered-test.ts'
import { sizeFault } from './size-fault.ts'

/**
 * All that has to be put right before an order can be placed: what is missing, parameters that a method does not know, and
 * sizes that it cannot take, with ways out. Without `offers` prices and scopes are not looked at.
 */
export function orderFaults(order: Order, offers?: readonly MethodOffer[]): OrderFault[] {
  const general = order.samples.length === 0 ? [fault(null, null, 'samples', 'the order has no samples yet')] : []
  const columns = order.columns.map((column) => ({ column, faults: columnFaults(order, column, offers) }))
  const broken = new Set(columns.filter(({ faults }) => faults.some(({ field }) => field.startsWith('parameters') || field === 'methodId')).map(({ column }) => column.key))
  return [...general, ...columns.flatMap(({ faults }) => faults), ...order.samples.flatMap((sample, row) => sampleFaults(order, sample, row, broken))]
}

function columnFaults(order: Order, column: OrderColumn, offers: readonly MethodOffer[] | undefined): OrderFault[] {
  const say = (field: string, message: string) => fault(null, column.key, field, message)
  if (order.columns.find(({ key }) => key === column.key) !== column) return [say('key', `two tests have the key "${column.key}"`)]
  const { method, issues, label } = orderedTest(column)
  if (!method) return (issues ?? []).map(({ field, message }) => say(field, message))
  const unknown = (column.requirement?.limits ?? []).filter(({ key }) => !method.resultNames.some((name) => name.key === key))
  const offer = offers?.find(({ methodId }) => methodId === method.id)
  return [
    ...(issues ?? []).map(({ field, message }) => say(field ? `parameters.${field}` : 'parameters', `${method.title}: ${message}`)),
    ...unknown.map(({ key }) => say('requirement', `${label} does not report "${key}", so it cannot be limited`)),
    ...(offers && !offer ? [say('methodId', `${method.title} is not in the price list`)] : []),
    ...(offer && order.siteId !== null && !offer.siteIds.includes(order.siteId) ? [say('siteId', `the chosen site does not offer ${label}; leave the site open or choose another`)] : []),
  ]
}

function sampleFaults(order: Order, sample: OrderSample, row: number, broken: ReadonlySet<string>): OrderFault[] {
  const size = sizeFault(sample.piece)
  const unknown = sample.tests.filter((key) => !order.columns.some((column) => column.key === key))
  return [
    ...(sample.material === '' ? [fault(row, null, 'material', 'say what material it is')] : []),
    ...(size ? [fault(row, null, `piece.${size.field}`, size.message)] : []),
    ...(sample.tests.length === 0 ? [fault(row, null, 'tests', 'tick at least one test')] : []),
    ...unknown.map((key) => fault(row, key, 'tests', `the order has no test "${key}"`)),
    ...(size ? [] : orderedTests(order, sample).flatMap((test) => testFaults(test, sample, row, broken))),
  ]
}

function testFaults({ column, method, parameters, issues, label }: OrderedTest, sample: OrderSample, row: number, broken: ReadonlySet<string>): OrderFault[] {
  // what is wrong with the column is said once, at its head
  if (!method || (issues && broken.has(column.key) && !sample.overrides[column.key])) return []
  if (issues) return issues.map(({ field, message }) => fault(row, column.key, `overrides.${column.key}.${field}`, `${label}: ${message}`))
  return method.misfits(parameters, sample.piece).map(({ message, cures }) => ({ row, column: column.key, field: 'tests', message, cures }))
}

function fault(row: number | null, column: string | null, field: string, message: string): OrderFault {
  return { row, column, field, message, cures: [] }
}
