import type { ReactNode } from 'react'
import type { Check } from '../../../shared/method/method.ts'
import { Button } from '../../components/ui/buttons/button.tsx'
import { IconButton } from '../../components/ui/buttons/icon-button.tsx'
import { classNames } from '../../components/ui/class-names.ts'
import { Icon } from '../../components/ui/icon.tsx'
import { formatNumber } from '../../lib/format.ts'
import type { SheetViewProps } from '../sheet-view.ts'
import type { GridColumn } from './grid-column.ts'
import type { SetRow } from './set-rows.ts'
import { shortMessage } from './short-message.ts'

/** A kept row: red while it breaks a rule, struck through with its reason when struck out, with a choice when two rows want its place. */
export function GridRow({ row: { reading, index, number, counts }, rowName, columns, more, checks, locked, settle, onStrike, nextPath }: {
  row: SetRow
  rowName: string
  columns: readonly GridColumn[]
  more: { cell: (value: Record<string, unknown>) => ReactNode }[] | undefined
  checks: readonly Check[]
  locked: string
  settle: SheetViewProps['settle']
  onStrike: () => void
  nextPath: string
}) {
  const value = typeof reading.value === 'object' && reading.value !== null ? (Object.fromEntries(Object.entries(reading.value)) as Record<string, unknown>) : {}
  const error = checks.find(({ severity }) => severity === 'error')
  const warning = checks.find(({ severity }) => severity === 'warning')
  const shown = (column: GridColumn) => {
    const given = value[column.field.name]
    return typeof given === 'number' ? formatNumber(given, column.decimals) : ''
  }
  const cell = classNames('h-12.5 border-b border-line', error && 'bg-red-wash text-red', reading.struck && 'text-quiet line-through')
  const name = counts ? String(number) : String(index + 1)
  return (
    <tr tabIndex={-1} data-row={reading.key} className="group text-17 focus-visible:outline-3 focus-visible:-outline-offset-3">
      <th scope="row" className={classNames(cell, 'w-16 pr-3 text-left font-normal', error ? 'pl-3 shadow-[inset_3px_0_var(--red)]' : !reading.struck && 'text-quiet')}>{name}</th>
      {columns.map((column, place) => (
        <td key={column.field.name} className={classNames(cell, 'px-3', place === 0 ? 'font-mono text-26 font-medium tracking-tight' : 'text-right')}>{shown(column)}</td>
      ))}
      {more?.map((one, place) => <td key={place} className={classNames(cell, 'px-3 text-right')}>{counts ? one.cell(value) : ''}</td>)}
      <td className={classNames('h-12.5 border-b border-line pl-3 text-15', error && 'bg-red-wash')}>
        <span className="flex items-center justify-between gap-3">
          <Say {...{ reading, error, warning }} />
          {reading.clash && !locked ? (
            <span className="flex gap-2">
              <Button size="tiny" onClick={() => settle.keepAs(reading.key, nextPath)}>Keep it as {rowName.toLowerCase()} {Number(nextPath.split('.')[1]) + 1}</Button>
              <Button size="tiny" kind="soft" onClick={() => settle.drop(reading.key)}>Leave it out</Button>
            </span>
          ) : !reading.struck && !locked && (
            <IconButton icon="cross" label={`Strike out ${rowName.toLowerCase()} ${name}`} className={classNames('size-11!', !error && 'opacity-0 group-hover:opacity-100 group-focus:opacity-100 focus-visible:opacity-100 [@media(hover:none)]:opacity-100')} onClick={onStrike} />
          )}
        </span>
      </td>
    </tr>
  )
}

function Say({ reading, error, warning }: { reading: SetRow['reading']; error: Check | undefined; warning: Check | undefined }) {
  if (reading.struck) return <span className="text-13 text-quiet">struck out: {reading.struck.reason}</span>
  if (reading.clash) return <span className="flex gap-1.5 font-medium text-amber"><Icon name="warning" className="mt-1" />kept on this device, but another screen has kept this row</span>
  if (reading.refused) return <span className="text-red">not kept by the server: {reading.refused}</span>
  if (error) return <span className="flex gap-1.5 font-medium text-red"><Icon name="stop" className="mt-1" />{shortMessage(error.message)}</span>
  if (warning) return <span className="flex gap-1.5 text-amber"><Icon name="warning" className="mt-1" />{shortMessage(warning.message)}</span>
  return <span className="text-13 text-quiet">{reading.where === 'device' ? 'on this device' : ''}</span>
}
