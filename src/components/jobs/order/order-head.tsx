import type { Job } from '../../../../shared/api/jobs.ts'
import { afterwardsChoices } from '../../../../shared/api/orders.ts'
import { DateField } from '../../ui/fields/date-field.tsx'
import { SelectField } from '../../ui/fields/select-field.tsx'
import { TextField } from '../../ui/fields/text-field.tsx'
import { Attachments } from './attachments.tsx'
import type { DraftHead } from '../draft/draft-state.ts'

/** What holds for the whole order: its number at the customer's, the day, what becomes of the samples, drawings. */
export function OrderHead({ job, head, onHead }: { job: Job; head: DraftHead; onHead: (change: Partial<DraftHead>, mark: string) => void }) {
  return (
    <div className="mb-7 grid grid-cols-[1fr_1fr_1.3fr_1.2fr] items-start gap-x-5 gap-y-3.5 max-list:grid-cols-2">
      <TextField label="Purchase order" maxLength={60} value={head.purchaseOrder} onChange={(event) => onHead({ purchaseOrder: event.target.value }, 'purchaseOrder')} />
      <DateField label="Needed by" aside="if any" value={head.neededBy ?? ''} onChange={(event) => onHead({ neededBy: event.target.value || null }, 'neededBy')} />
      <SelectField
        label="Samples afterwards" className="max-list:col-span-full" choices={afterwardsChoices.map((value) => ({ value, label: value }))} value={head.afterwards}
        onChange={(event) => onHead({ afterwards: afterwardsChoices.find((choice) => choice === event.target.value) ?? head.afterwards }, 'afterwards')}
      />
      <Attachments job={job} className="max-list:col-span-full" />
    </div>
  )
}
