import type { ReactNode } from 'react'
import type { OrderColumn, OrderFault } from '../../../../shared/api/orders.ts'
import { formFields } from '../../../../shared/method/form.ts'
import type { Method } from '../../../../shared/method/method.ts'
import { orderedTest } from '../../../../shared/orders/ordered-test.ts'
import { asSentence } from '../../../lib/refused-field.ts'
import { Button } from '../../ui/buttons/button.tsx'
import { classNames } from '../../ui/class-names.ts'
import { Popover } from '../../ui/feedback/popover.tsx'
import { FieldError } from '../../ui/fields/field.tsx'
import { Tick } from '../../ui/fields/tick.tsx'
import { SchemaFields } from '../../ui/form/schema-fields.tsx'
import { Icon } from '../../ui/icon.tsx'
import { limitText } from '../../ui/limits/limit-rule.tsx'
import { LimitsForm } from './limits-form.tsx'

export type ColumnDeeds = { change: (column: OrderColumn) => void; tickAll: (key: string, ticked: boolean) => void; remove: (key: string) => void }

/** The head of a test's column: what it is, how it is done, its limits; opens the panel where they are set. Its tick stands for all rows. */
export function ColumnHead({ column, first, ticked, rows, faults, deeds }: { column: OrderColumn; first: boolean; ticked: number; rows: number; faults: readonly OrderFault[]; deeds: ColumnDeeds }) {
  const { label } = orderedTest(column)
  return (
    <th scope="col" className={classNames('tst', first && 'first', faults.length > 0 && 'bad')}>
      <ColumnPanel
        column={column} faults={faults} deeds={deeds}
        trigger={
          <button type="button" className="block w-full text-left hover:[&_b]:underline">
            <b className={classNames('block pr-5 text-13 font-bold', faults.length > 0 ? 'text-red' : 'text-ink')}>{faults.length > 0 && <Icon name="stop" className="mr-1 inline size-3.5! align-[-2px]" />}{label}</b>
            <span className="line-clamp-2" title={columnSummary(column)}>{columnSummary(column)}</span>
            <span className="block">{requirementWords(column)}</span>
          </button>
        }
      />
      <Tick label={`${label}, all rows`} labelHidden checked={rows > 0 && ticked === rows} mixed={ticked > 0 && ticked < rows} onChange={(event) => deeds.tickAll(column.key, event.target.checked)} className="absolute! top-1.5 right-2" />
    </th>
  )
}

/** The parameters and limits of a test, beside the button that opens it. */
export function ColumnPanel({ column, faults, deeds, trigger }: { column: OrderColumn; faults: readonly OrderFault[]; deeds: ColumnDeeds; trigger: ReactNode }) {
  const { method, label } = orderedTest(column)
  return (
    <Popover label={`How ${label} is done`} trigger={trigger} className="w-[min(480px,calc(100vw-24px))]! font-normal">
      <h3 className="mb-3 text-15 font-bold">{method?.title ?? label}</h3>
      {method && <Parameters column={column} method={method} faults={faults} onColumn={deeds.change} />}
      <Button size="tiny" kind="danger" className="mt-4" onClick={() => deeds.remove(column.key)}>Remove this test</Button>
    </Popover>
  )
}

function Parameters({ column, method, faults, onColumn }: { column: OrderColumn; method: Method; faults: readonly OrderFault[]; onColumn: (column: OrderColumn) => void }) {
  const fields = formFields(method.parameters).filter(({ name }) => !method.measured.includes(name))
  const problems = Object.fromEntries(faults.filter(({ field }) => field.startsWith('parameters.')).map(({ field, message }) => [field.slice('parameters.'.length), asSentence(message)]))
  const others = faults.filter(({ field }) => !field.startsWith('parameters.'))
  return (
    <div className="grid gap-4">
      <SchemaFields fields={fields} value={column.parameters} onValue={(parameters) => onColumn({ ...column, parameters })} problems={problems} />
      {others.map(({ message }) => <FieldError key={message}>{asSentence(message)}</FieldError>)}
      <LimitsForm names={method.resultNames} mainResult={method.mainResult} value={column.requirement} onValue={(requirement) => onColumn({ ...column, requirement })} />
    </div>
  )
}

/** "ASTM E18-22, 3 readings or more"; empty while a parameter is wrong. */
export function columnSummary(column: OrderColumn): string {
  const { method, parameters } = orderedTest(column)
  return method && parameters ? method.summary(parameters) : ''
}

/** "29 to 34, guarded", "4 limits", "no limits". */
export function requirementWords({ requirement }: Pick<OrderColumn, 'requirement'>): string {
  const [first, second] = requirement?.limits ?? []
  if (!requirement || !first) return 'no limits'
  const words = second ? `${requirement.limits.length} limits` : limitText(first.lower, first.upper)
  return requirement.rule === 'guarded' ? `${words}, guarded` : words
}
