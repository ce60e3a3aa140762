import { useState } from 'react'
import { largestFile } from '../../../../shared/api/files.ts'
import { FileField } from '../../../components/ui/fields/file-field.tsx'
import type { SheetViewProps } from '../../sheet-view.ts'
import { findManner, readRows, tableOf } from './read-table.ts'
import { guessColumns } from './guess-columns.ts'
import { RecordPanel, type Opened } from './record-panel.tsx'
import { rememberedChoices } from './remembered-choices.ts'

/** Takes the frame's record: dropped or chosen, looked at, its columns named, then kept with the run. */
export function RecordImport({ sheet }: { sheet: SheetViewProps }) {
  const [opened, setOpened] = useState<Opened>()
  const [problem, setProblem] = useState<string>()
  const open = async (file: File | undefined) => {
    if (!file) return
    setProblem(undefined)
    try {
      const text = await file.text()
      const found = await findManner(text)
      const before = rememberedChoices(sheet.run.benchId)
      // what was chosen for this frame holds as long as its columns are there
      const known = before && tableOf(await readRows(text, before.delimiter, 60), before.headingRows)
      const fits = before && known && [before.extension, before.force].every(({ column }) => known.names.includes(column))
      setOpened({ file, text, manner: fits ? before : found, decimal: fits ? before.decimal : found.decimal, columns: fits ? before : guessColumns(tableOf(await readRows(text, found.delimiter, 60), found.headingRows)) })
    } catch {
      setProblem(`${file.name} could not be read as text.`)
    }
  }
  if (opened) return <RecordPanel key={opened.file.name + String(opened.file.lastModified)} sheet={sheet} opened={opened} onClose={() => setOpened(undefined)} />
  return (
    <FileField
      className="mt-1" label="Drop the frame's record here" action="choose it" hint="A text table with time, extension and force: CSV or TXT, up to 25 MB. It is kept with the run as it came." accept=".csv,.txt,.tsv,.dat,text/csv,text/plain"
      maxBytes={largestFile} onFiles={([file]) => void open(file)} error={problem}
    />
  )
}
