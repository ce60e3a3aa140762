import { useRef, useState, type KeyboardEvent, type RefObject } from 'react'
import { cellNames, withTick, type CellName } from '../draft/draft-state.ts'
import type { OrderDraft } from '../draft/use-order-draft.ts'
import { filledDown } from '../draft/use-row-deeds.ts'
import { controlAt, moveOf, placeOf, type GridPlace } from './grid-moves.ts'

/** Cells of one column chosen together with Shift and the arrows, from where the cursor began. */
export type Together = { column: number; from: number; to: number }

/** The keys of the grid: arrows and Enter between cells, Shift to choose several, Ctrl D fills down, Space ticks those chosen, Ctrl Z and Ctrl Y. */
export function useGridKeys(grid: RefObject<HTMLElement | null>, { state, change, undo, redo }: Pick<OrderDraft, 'state' | 'change' | 'undo' | 'redo'>) {
  const anchor = useRef<GridPlace>(undefined)
  const [together, setTogether] = useState<Together | null>(null)
  const go = (place: GridPlace) => {
    const control = controlAt(grid.current, place)
    control?.focus()
    if (control?.type === 'text') control.select()
    return control !== null
  }
  const cellAt = (column: number): CellName | { test: string } | undefined => cellNames[column] ?? (state.columns[column - cellNames.length] && { test: state.columns[column - cellNames.length]!.key })

  const onKeyDown = (event: KeyboardEvent) => {
    const ctrl = event.ctrlKey || event.metaKey
    const key = event.key.toLowerCase()
    if (ctrl && (key === 'z' || key === 'y')) {
      event.preventDefault()
      return key === 'y' || event.shiftKey ? redo() : undo()
    }
    const place = placeOf(event.target)
    if (!place) return
    if (ctrl && key === 'd') {
      event.preventDefault()
      const cell = cellAt(place.column)
      const { from, to } = together?.column === place.column && together.from !== together.to ? together : { from: place.row - 1, to: place.row }
      if (cell && from >= 0) change((now) => filledDown(now, cell, from, Math.min(to, now.rows.length - 1)))
      return
    }
    if (key === ' ' && together && together.from !== together.to && together.column >= cellNames.length) {
      const cell = cellAt(together.column)
      if (typeof cell !== 'object') return
      event.preventDefault()
      const chosen = state.rows.slice(together.from, together.to + 1)
      const all = chosen.every(({ sample }) => sample.tests.includes(cell.test))
      return change((now) => withTick(now, cell.test, new Set(chosen.map(({ id }) => id)), !all))
    }
    if (key === 'escape') return setTogether(null)
    const next = moveOf(event, place)
    if (!next) return
    if (event.target instanceof HTMLInputElement && event.target.type === 'checkbox' && event.key === 'Enter') event.preventDefault()
    event.preventDefault()
    const vertical = event.key === 'ArrowUp' || event.key === 'ArrowDown'
    if (event.shiftKey && vertical) {
      anchor.current ??= place
      const start = anchor.current.row
      if (go(next)) setTogether({ column: place.column, from: Math.min(start, next.row), to: Math.max(start, next.row) })
      return
    }
    anchor.current = undefined
    setTogether(null)
    go(next)
  }
  const onPointerDown = () => {
    anchor.current = undefined
    setTogether(null)
  }
  return { together, onKeyDown, onPointerDown }
}
