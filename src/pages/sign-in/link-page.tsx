import { zodResolver } from '@hookform/resolvers/zod'
import { useQuery } from '@tanstack/react-query'
import { useForm } from 'react-hook-form'
import { useNavigate, useParams } from 'react-router-dom'
import type * as z from 'zod'
import { useLink, type readLink } from '../../../shared/api/sessions.ts'
import { linkQuery, useLinkPassword } from '../../api/session.ts'
import { Door } from '../../components/sign-in/door.tsx'
import { PasswordField } from '../../components/sign-in/password-field.tsx'
import { passwordRules } from '../../components/sign-in/password-rules.ts'
import { Button } from '../../components/ui/buttons/button.tsx'
import { ButtonLink } from '../../components/ui/buttons/button-link.tsx'
import { Note } from '../../components/ui/feedback/note.tsx'
import { refusalWords, refusedField } from '../../lib/refused-field.ts'
import { Refusal } from '../../lib/refusal.ts'

/** Where an invitation or a forgotten password ends: a new password, and in. */
export function LinkPage() {
  const { token = '' } = useParams()
  const link = useQuery(linkQuery(token))
  if (link.data) return <NewPassword token={token} {...link.data} />
  if (link.isPending) return <Door title="One moment"><p role="status" className="text-quiet">Looking at your link</p></Door>
  const isSpent = link.error instanceof Refusal && (link.error.code === 'not-found' || link.error.code === 'not-acceptable')
  if (!isSpent) {
    return (
      <Door title="The link was not looked at">
        <Note kind="bad">{refusalWords(link.error)} The link is not used up by this.</Note>
        <div><Button size="big" busy={link.isFetching} onClick={() => void link.refetch()}>Try again</Button></div>
      </Door>
    )
  }
  return (
    <Door title="This link does not work" under="It has been used, is too old, or did not arrive whole.">
      <p>Each link works once: an invitation for three days, a link for a forgotten password for one hour. Asking again ends the ones before.</p>
      <p className="text-quiet">If you have set a password already, sign in. If you were invited, ask who invited you to send it again.</p>
      <div className="flex flex-wrap items-center gap-5">
        <ButtonLink to="/sign-in" kind="main" size="big">Sign in</ButtonLink>
        <ButtonLink to="/forgotten" kind="bare">Ask for a new link</ButtonLink>
      </div>
    </Door>
  )
}

function NewPassword({ token, purpose, name, email }: { token: string } & z.infer<typeof readLink.response>) {
  const navigate = useNavigate()
  const set = useLinkPassword(token)
  const { register, handleSubmit, formState: { errors } } = useForm({ resolver: zodResolver(useLink.body), defaultValues: { password: '' } })
  const submit = handleSubmit((body) => set.mutate(body, { onSuccess: () => void navigate('/', { replace: true }) }))
  const refused = refusalWords(set.error, ['password'])
  return (
    <Door title={purpose === 'invitation' ? `Welcome, ${name}` : 'New password'} under={purpose === 'invitation' ? 'Choose a password, and you are in.' : 'It takes the place of the old one everywhere.'}>
      <form noValidate onSubmit={submit} className="grid gap-5">
        {refused && <Note kind="bad">{refused}</Note>}
        <div>
          <p className="text-13 font-medium">For</p>
          <p className="break-words">{email}</p>
          <input type="text" name="username" autoComplete="username" value={email} readOnly hidden />
        </div>
        <PasswordField label="New password" autoComplete="new-password" autoFocus hint={passwordRules} error={refusedField(set.error, 'password', errors.password)} {...register('password')} />
        <div className="mt-1"><Button type="submit" kind="main" size="big" busy={set.isPending}>{purpose === 'invitation' ? 'Set it and begin' : 'Set it and sign in'}</Button></div>
      </form>
    </Door>
  )
}
