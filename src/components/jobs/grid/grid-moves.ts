import type { KeyboardEvent } from 'react'

/** Where a cell of the grid is. */
export type GridPlace = { row: number; column: number }

/** The control of a cell, found by where it stands. */
export function controlAt(grid: HTMLElement | null, { row, column }: GridPlace): HTMLInputElement | null {
  return grid?.querySelector<HTMLInputElement>(`[data-row="${row}"][data-column="${column}"] input`) ?? null
}

/** Where a cell's control stands; undefined for what is in no cell. */
export function placeOf(target: EventTarget | null): GridPlace | undefined {
  const cell = target instanceof HTMLElement ? target.closest<HTMLElement>('[data-row][data-column]') : null
  return cell ? { row: Number(cell.dataset['row']), column: Number(cell.dataset['column']) } : undefined
}

/**
 * The cell that a key goes to: up and down always, left and right where the text ends (or all of it is chosen), Enter down.
 * Undefined when the key belongs to the text.
 */
export function moveOf(event: KeyboardEvent, { row, column }: GridPlace): GridPlace | undefined {
  if (event.altKey || event.ctrlKey || event.metaKey) return undefined
  switch (event.key) {
    case 'ArrowUp': return { row: row - 1, column }
    case 'ArrowDown': return { row: row + 1, column }
    case 'Enter': return { row: event.shiftKey ? row - 1 : row + 1, column }
    case 'ArrowLeft': return !event.shiftKey && isAtEdge(event.target, 'start') ? { row, column: column - 1 } : undefined
    case 'ArrowRight': return !event.shiftKey && isAtEdge(event.target, 'end') ? { row, column: column + 1 } : undefined
    default: return undefined
  }
}

function isAtEdge(target: EventTarget, edge: 'start' | 'end'): boolean {
  if (!(target instanceof HTMLInputElement) || target.type === 'checkbox') return true
  const { selectionStart, selectionEnd, value } = target
  if (selectionStart === 0 && selectionEnd === value.length) return true
  return edge === 'start' ? selectionEnd === 0 : selectionStart === value.length
}
