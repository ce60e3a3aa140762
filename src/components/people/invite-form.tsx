import { zodResolver } from '@hookform/resolvers/zod'
import { useQuery } from '@tanstack/react-query'
import { useForm } from 'react-hook-form'
import * as z from 'zod'
import { placeOf } from '../../../shared/access/place-of.ts'
import { InvitePerson } from '../../../shared/api/people.ts'
import { Role } from '../../../shared/api/words.ts'
import { catalogueQuery } from '../../api/catalogue.ts'
import { customersQuery, useInvitePerson } from '../../api/people.ts'
import { useMe } from '../../api/session.ts'
import { refusalWords, refusedField } from '../../lib/refused-field.ts'
import { Button } from '../ui/buttons/button.tsx'
import { Note } from '../ui/feedback/note.tsx'
import { useToast } from '../ui/feedback/toast-region.tsx'
import { SelectField } from '../ui/fields/select-field.tsx'
import { TextField } from '../ui/fields/text-field.tsx'
import { capital } from './capital.ts'
import { keptForm, useKeptForm } from './use-kept-form.ts'

const Typed = z.strictObject({ name: z.string().trim().min(1, 'is needed').max(100, 'at most 100 characters'), email: InvitePerson.shape.email, role: Role, place: z.string().min(1, 'choose one') })
const empty = { name: '', email: '', role: '', place: '' }

/** Invites a colleague to a site, or a client for their organisation. They choose their password by the link that is mailed to them. */
export function InviteForm({ onDone }: { onDone: (personId: string) => void }) {
  const me = useMe()
  const say = useToast()
  const invite = useInvitePerson()
  const form = useForm({ resolver: zodResolver(Typed), defaultValues: keptForm('invite', empty) as { name: string; email: string; role: Role; place: string } })
  const forget = useKeptForm('invite', form)
  const { register, handleSubmit, watch, setValue, formState: { errors } } = form
  const role = Role.safeParse(watch('role')).data
  const isCustomers = role !== undefined && placeOf(role) === 'customer'
  const customers = useQuery({ ...customersQuery, enabled: isCustomers })
  const catalogue = useQuery(catalogueQuery)
  const places = isCustomers ? (customers.data?.items ?? []) : (catalogue.data?.sites ?? []).filter(({ id }) => me.siteIds.includes(id))
  const submit = handleSubmit(({ place, ...typed }) => {
    const customer = placeOf(typed.role) === 'customer'
    invite.mutate({ ...typed, siteId: customer ? null : place, customerId: customer ? place : null }, {
      onSuccess: (person) => {
        forget(empty as Parameters<typeof forget>[0])
        say({ text: <>{person.name} is invited. The link goes to {person.email} and works for three days.</> })
        onDone(person.id)
      },
    })
  })
  const refused = refusalWords(invite.error, ['name', 'email', 'role', 'siteId', 'customerId'])
  return (
    <form noValidate onSubmit={submit} className="grid gap-4">
      {refused && <Note kind="bad">{refused}</Note>}
      <TextField label="Name" autoFocus autoComplete="off" error={refusedField(invite.error, 'name', errors.name)} {...register('name')} />
      <TextField label="Email" type="email" inputMode="email" error={refusedField(invite.error, 'email', errors.email)} {...register('email')} />
      <SelectField label="Role" empty="Choose" choices={Role.options.map((value) => ({ value, label: capital(value) }))} error={errors.role && 'Choose one.'} {...register('role', { onChange: () => setValue('place', '') })} />
      {role && (
        <SelectField
          label={isCustomers ? 'Customer' : 'Site'} empty={places.length === 0 ? 'Loading' : 'Choose'} choices={places.map(({ id, name }) => ({ value: id, label: name }))}
          error={refusedField(invite.error, isCustomers ? 'customerId' : 'siteId', errors.place)} {...register('place')}
        />
      )}
      <p className="text-13 text-quiet">The link in the mail works once, for three days. Inviting again sends a new one.</p>
      <div><Button type="submit" kind="main" busy={invite.isPending}>Send the invitation</Button></div>
    </form>
  )
}
