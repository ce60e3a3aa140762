import { useRef, useState } from 'react'
import { pasteTable, type Pasted, type PastedColumn } from './paste-table.ts'
import type { OrderDraft } from './use-order-draft.ts'

type Last = { key: number; pasted: Pasted; firstRow: readonly string[]; table: readonly (readonly string[])[]; at: { row: number; cell: number } }

/** Pasting rows of a spreadsheet, with what came of it until the next change of mind. */
export function usePaste({ state, change, undo }: Pick<OrderDraft, 'state' | 'change' | 'undo'>) {
  const [last, setLast] = useState<Last | null>(null)
  const count = useRef(0)
  const put = (from: OrderDraft['state'], table: Last['table'], at: Last['at'], columns?: readonly PastedColumn[]) => {
    const pasted = pasteTable(from, table, at, columns)
    if (pasted.count > 0) change(() => pasted.state)
    const filled = table.filter((row) => row.some((text) => text.trim() !== ''))
    setLast({ key: count.current++, pasted, table, at, firstRow: filled[1] ?? [] })
  }
  return {
    last,
    take: async (text: string, at: { row: number; cell: number }) => {
      // spreadsheets quote cells that hold tabs, quotes or line breaks; the reader of such tables is fetched when one is pasted
      const { default: papa } = await import('papaparse')
      const { data } = papa.parse<string[]>(text, { delimiter: text.includes('\t') ? '\t' : '', skipEmptyLines: true })
      put(state, data, at)
    },
    again: (columns: readonly PastedColumn[]) => {
      if (!last) return
      const before = { ...state, rows: state.rows.filter((row) => !last.pasted.state.rows.slice(-last.pasted.count).some(({ id }) => id === row.id)) }
      put(before, last.table, last.at, columns)
    },
    undo: () => {
      setLast(null)
      undo()
    },
    close: () => setLast(null),
  }
}
