import { zodResolver } from '@hookform/resolvers/zod'
import { useQuery } from '@tanstack/react-query'
import { useForm } from 'react-hook-form'
import { Link, Navigate, useLocation } from 'react-router-dom'
import { SignIn } from '../../../shared/api/sessions.ts'
import { sessionQuery, useSignIn } from '../../api/session.ts'
import { Door } from '../../components/sign-in/door.tsx'
import { PasswordField } from '../../components/sign-in/password-field.tsx'
import { Button } from '../../components/ui/buttons/button.tsx'
import { Note } from '../../components/ui/feedback/note.tsx'
import { TextField } from '../../components/ui/fields/text-field.tsx'
import { Tick } from '../../components/ui/fields/tick.tsx'
import { refusalWords, refusedField } from '../../lib/refused-field.ts'

/** The page that was asked for before the sign-in; only ever one of our own. */
function wantedPage(state: unknown): string {
  const from: unknown = typeof state === 'object' && state !== null && 'from' in state ? state.from : undefined
  return typeof from === 'string' && /^\/(?![/\\])/.test(from) ? from : '/'
}

export function SignInPage() {
  const location = useLocation()
  const { data: session } = useQuery(sessionQuery)
  const signIn = useSignIn()
  const { register, handleSubmit, resetField, setFocus, formState: { errors } } = useForm({ resolver: zodResolver(SignIn), defaultValues: { email: '', password: '', sharedScreen: false } })
  if (session?.me) return <Navigate to={wantedPage(location.state)} replace />

  const submit = handleSubmit((body) => signIn.mutate({ ...body, sharedScreen: body.sharedScreen ?? false }, {
    onError: () => {
      resetField('password')
      setFocus('password')
    },
  }))
  const refused = refusalWords(signIn.error, ['email', 'password'])
  return (
    <Door title="Sign in" under={session ? `to ${session.company}` : 'to the lab'}>
      <form noValidate onSubmit={submit} className="grid gap-5">
        {refused && <Note kind="bad">{refused}</Note>}
        <TextField label="Email" type="email" inputMode="email" autoComplete="username" autoFocus error={refusedField(signIn.error, 'email', errors.email)} {...register('email')} />
        <PasswordField autoComplete="current-password" error={refusedField(signIn.error, 'password', errors.password)} {...register('password')} />
        <Tick label="This is a shared bench screen" hint="Signed out after half an hour without a touch." {...register('sharedScreen')} />
        <div className="mt-1 flex flex-wrap items-center gap-5">
          <Button type="submit" kind="main" size="big" busy={signIn.isPending}>Sign in</Button>
          <Link to="/forgotten">Forgotten password</Link>
        </div>
      </form>
    </Door>
  )
}
