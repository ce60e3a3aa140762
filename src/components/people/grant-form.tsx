import { zodResolver } from '@hookform/resolvers/zod'
import { useForm } from 'react-hook-form'
import * as z from 'zod'
import { grantAuthorisation, type Person } from '../../../shared/api/people.ts'
import { Right } from '../../../shared/api/words.ts'
import { methods, methodOf } from '../../../shared/methods.ts'
import { useGrantAuthorisation } from '../../api/people.ts'
import { formatDay } from '../../lib/format.ts'
import { refusalWords, refusedField } from '../../lib/refused-field.ts'
import { Button } from '../ui/buttons/button.tsx'
import { Note } from '../ui/feedback/note.tsx'
import { useToast } from '../ui/feedback/toast-region.tsx'
import { DateField } from '../ui/fields/date-field.tsx'
import { SelectField } from '../ui/fields/select-field.tsx'
import { TextArea } from '../ui/fields/text-area.tsx'
import { capital } from './capital.ts'
import { keptForm, useKeptForm } from './use-kept-form.ts'

const Typed = grantAuthorisation.body.extend({ methodId: z.string().min(1, 'choose one'), until: z.iso.date('choose a day'), evidence: z.string().trim().min(1, 'is needed: what shows that they can').max(500, 'at most 500 characters') })
const empty = { methodId: '', right: '', until: '', evidence: '' }
type Input = z.input<typeof Typed>

/** Lets a person carry out, review or sign for a method until a day; granting it again sets the new day. */
export function GrantForm({ person }: { person: Person }) {
  const say = useToast()
  const grant = useGrantAuthorisation()
  const form = useForm({ resolver: zodResolver(Typed), defaultValues: keptForm(`grant.${person.id}`, empty) as Input })
  const forget = useKeptForm(`grant.${person.id}`, form)
  const { register, handleSubmit, formState: { errors } } = form
  const submit = handleSubmit((body) => grant.mutate({ personId: person.id, ...body }, {
    onSuccess: () => {
      forget(empty as Input)
      say({ text: `${person.name}: ${methodOf(body.methodId)?.title ?? body.methodId}, ${body.right} until ${formatDay(body.until, 'full')}.` })
    },
  }))
  const refused = refusalWords(grant.error, ['methodId', 'right', 'until', 'evidence'])
  return (
    <form noValidate onSubmit={submit} className="grid gap-4" aria-label={`Authorise ${person.name}`}>
      {refused && <Note kind="bad">{refused}</Note>}
      <div className="grid grid-cols-2 gap-4">
        <SelectField label="Method" empty="Choose" choices={methods.map(({ id, title }) => ({ value: id, label: title }))} error={refusedField(grant.error, 'methodId', errors.methodId)} {...register('methodId')} />
        <SelectField label="May" empty="Choose" choices={Right.options.map((value) => ({ value, label: capital(value) }))} error={errors.right && 'Choose one.'} {...register('right')} />
      </div>
      <DateField label="Last day" hint="At most five years from now. A right that stands already gets this day." error={refusedField(grant.error, 'until', errors.until)} {...register('until')} />
      <TextArea label="On what grounds" rows={2} hint="Training record, comparison, supervised runs." error={refusedField(grant.error, 'evidence', errors.evidence)} {...register('evidence')} />
      <div><Button type="submit" busy={grant.isPending}>Authorise</Button></div>
    </form>
  )
}
