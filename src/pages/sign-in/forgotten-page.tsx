import { zodResolver } from '@hookform/resolvers/zod'
import { useForm } from 'react-hook-form'
import { Link } from 'react-router-dom'
import { askPasswordReset } from '../../../shared/api/sessions.ts'
import { useAskPasswordReset } from '../../api/session.ts'
import { Door } from '../../components/sign-in/door.tsx'
import { Button } from '../../components/ui/buttons/button.tsx'
import { ButtonLink } from '../../components/ui/buttons/button-link.tsx'
import { Note } from '../../components/ui/feedback/note.tsx'
import { TextField } from '../../components/ui/fields/text-field.tsx'
import { refusalWords, refusedField } from '../../lib/refused-field.ts'

/** Asks for a link by mail. What it says afterwards is the same whether the address is known or not. */
export function ForgottenPage() {
  const ask = useAskPasswordReset()
  const { register, handleSubmit, formState: { errors } } = useForm({ resolver: zodResolver(askPasswordReset.body), defaultValues: { email: '' } })
  if (ask.isSuccess) {
    return (
      <Door title="Look in your mail" under="Nothing has changed yet.">
        <p role="status">If <b className="break-words">{ask.variables.email}</b> has an account here, a link is on its way to it. It works once, for one hour.</p>
        <p className="text-quiet">Nothing after five minutes? Look among the unwanted mail, then ask a manager of your lab whether the address is right.</p>
        <div className="flex flex-wrap items-center gap-5">
          <ButtonLink to="/sign-in" size="big">To the sign-in</ButtonLink>
          <Button kind="bare" onClick={() => ask.reset()}>Another address</Button>
        </div>
      </Door>
    )
  }
  const refused = refusalWords(ask.error, ['email'])
  return (
    <Door title="Forgotten password" under="A link to set a new one comes by mail.">
      <form noValidate onSubmit={handleSubmit((body) => ask.mutate(body))} className="grid gap-5">
        {refused && <Note kind="bad">{refused}</Note>}
        <TextField label="Email" type="email" inputMode="email" autoComplete="username" autoFocus error={refusedField(ask.error, 'email', errors.email)} {...register('email')} />
        <div className="mt-1 flex flex-wrap items-center gap-5">
          <Button type="submit" kind="main" size="big" busy={ask.isPending}>Send the link</Button>
          <Link to="/sign-in">Sign in</Link>
        </div>
      </form>
    </Door>
  )
}
