import { useEffect, useMemo, useState } from 'react'
import type { OrderColumn } from '../../../../shared/api/orders.ts'
import type { ColumnDeeds } from '../grid/column-head.tsx'
import type { RowDeeds } from '../grid/grid-row.tsx'
import { emptyRow, freeKey, rowAfter, tidied, withCell, withCopy, withoutColumn, withRows, withTick, type CellName, type DraftRow, type DraftState } from './draft-state.ts'
import type { OrderDraft } from './use-order-draft.ts'

/** All that can be done to rows and columns. The fresh row becomes a sample, with the id it has, as soon as something is done to it. */
export function useRowDeeds({ state, change }: Pick<OrderDraft, 'state' | 'change'>): { fresh: DraftRow; rows: RowDeeds; columns: ColumnDeeds; addTest: (methodId: string, parameters: Record<string, unknown>) => void; addRow: () => string } {
  const [freshId, setFreshId] = useState(() => emptyRow([]).id)
  const last = state.rows.at(-1)
  const fresh = useMemo((): DraftRow => ({ ...(last ? rowAfter(last) : emptyRow(state.columns)), id: freshId }), [freshId, last, state.columns])
  const isUsed = state.rows.some(({ id }) => id === freshId)
  useEffect(() => {
    if (isUsed) setFreshId(emptyRow([]).id)
  }, [isUsed])

  const rows = useMemo((): RowDeeds => {
    const edit = (id: string, next: (row: DraftRow) => DraftRow, mark: string | null = null) => change((now) => withRows(withFresh(now, id), new Set([id]), next), mark)
    return {
      type: (id, cell, text) => edit(id, (row) => withCell(row, cell, text, true), `${id}.${cell}`),
      left: (id, cell) => (cell === 'size' || cell === 'form') && change((now) => (now.rows.some((row) => row.id === id && (row.size !== undefined || row.unread.form !== undefined)) ? withRows(now, new Set([id]), tidied) : now), `${id}.${cell}`),
      tick: (id, key, ticked) => change((now) => withTick(withFresh(now, id), key, new Set([id]), ticked)),
      override: (id, key, parameters) => edit(id, (row) => ({ ...row, sample: { ...row.sample, overrides: withOverride(row.sample.overrides, key, parameters) } })),
      correct: (id, cell) => document.getElementById(`cell-${id}-${cell}`)?.focus(),
      copy: (id) => change((now) => withCopy(now, id)),
      remove: (id) => change((now) => ({ ...now, rows: now.rows.filter((row) => row.id !== id) })),
    }
  }, [change])
  const columns = useMemo((): ColumnDeeds => ({
    change: (column: OrderColumn) => change((now) => ({ ...now, columns: now.columns.map((one) => (one.key === column.key ? column : one)) }), `column.${column.key}`),
    tickAll: (key, ticked) => change((now) => withTick(now, key, new Set(now.rows.map(({ id }) => id)), ticked)),
    remove: (key) => change((now) => withoutColumn(now, key)),
  }), [change])
  return {
    fresh, rows, columns,
    addTest: (methodId, parameters) => change((now) => addColumn(now, methodId, parameters)),
    addRow: () => { change((now) => withFresh(now, freshId)); return freshId },
  }
}

/** A new test is ticked for all rows: unticking the few that do not need it is less work than ticking the many. */
function addColumn(state: DraftState, methodId: string, parameters: Record<string, unknown>): DraftState {
  const key = freeKey(state.columns)
  const columns = [...state.columns, { key, methodId, parameters, requirement: null }]
  return withTick({ ...state, columns }, key, new Set(state.rows.map(({ id }) => id)), true)
}

function withFresh(state: DraftState, id: string): DraftState {
  if (state.rows.some((row) => row.id === id)) return state
  const last = state.rows.at(-1)
  return { ...state, rows: [...state.rows, { ...(last ? rowAfter(last) : emptyRow(state.columns)), id }] }
}

function withOverride(overrides: Record<string, Record<string, unknown>>, key: string, parameters: Record<string, unknown> | null): Record<string, Record<string, unknown>> {
  const { [key]: before, ...others } = overrides
  return parameters ? { ...others, [key]: { ...before, ...parameters } } : others
}

/** The values of one column copied from the first of some rows into the others: a cell's text, or a tick. */
export function filledDown(state: DraftState, cell: CellName | { test: string }, from: number, to: number): DraftState {
  const [source, ...others] = state.rows.slice(from, to + 1)
  if (!source || others.length === 0) return state
  const ids = new Set(others.map(({ id }) => id))
  if (typeof cell === 'object') return withTick(state, cell.test, ids, source.sample.tests.includes(cell.test))
  if (cell === 'size') return withRows(state, ids, (row) => withCell(row, 'size', source.unread.size ?? source.size ?? sizeOf(source)))
  return withRows(state, ids, (row) => withCell(row, cell, cell === 'form' ? source.unread.form ?? source.sample.piece.form : source.sample[cell]))
}

function sizeOf({ sample: { piece: { diameterMm, thicknessMm, widthMm } } }: DraftRow): string {
  return [diameterMm === undefined ? undefined : `Ø ${diameterMm}`, thicknessMm, widthMm].filter((part) => part !== undefined).join(' × ')
}
