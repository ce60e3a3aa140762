import { useState } from 'react'
import { Button } from '../buttons/button.tsx'
import { useToast } from '../feedback/toast-region.tsx'
import type { Column } from './column.ts'
import { csvText, downloadCsv } from './csv.ts'

/** Downloads a list as CSV. `rows` may be a function that fetches all of them, where only a part is on screen. */
export function CsvButton<Row>({ name, columns, rows }: { name: string; columns: readonly Column<Row>[]; rows: readonly Row[] | (() => Promise<readonly Row[]>) }) {
  const [busy, setBusy] = useState(false)
  const say = useToast()
  const save = async () => {
    setBusy(true)
    try {
      const all = typeof rows === 'function' ? await rows() : rows
      downloadCsv(name, csvText(columns, all))
      say({ text: `${name}.csv: ${all.length} rows saved.` })
    } catch (error) {
      say({ kind: 'bad', text: `The list was not saved. ${error instanceof Error ? error.message : ''}` })
    } finally {
      setBusy(false)
    }
  }
  return <Button kind="soft" icon="download" busy={busy} onClick={() => void save()}>CSV</Button>
}
