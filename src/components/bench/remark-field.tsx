import { TextArea } from '../ui/fields/text-area.tsx'

/** What the technician says to a warning; it stands in the report. */
export function RemarkField({ value, onValue, isNeeded, readOnly, error }: { value: string; onValue: (text: string) => void; isNeeded: boolean; readOnly: boolean; error: string | undefined }) {
  return (
    <div className="px-10 pb-6 max-desk:px-gutter">
      <TextArea
        className="max-w-160" label="Remark" aside={isNeeded ? 'has to explain the warning; stands in the report' : 'stands in the report'} rows={2} maxLength={1000}
        value={value} readOnly={readOnly} onChange={(event) => onValue(event.target.value)} error={error}
      />
    </div>
  )
}
