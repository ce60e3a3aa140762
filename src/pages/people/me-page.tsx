import { zodResolver } from '@hookform/resolvers/zod'
import { useForm } from 'react-hook-form'
import { changePassword } from '../../../shared/api/sessions.ts'
import { useChangePassword, useMe } from '../../api/session.ts'
import { capital } from '../../components/people/capital.ts'
import { PasswordField } from '../../components/sign-in/password-field.tsx'
import { passwordRules } from '../../components/sign-in/password-rules.ts'
import { Button } from '../../components/ui/buttons/button.tsx'
import { Note } from '../../components/ui/feedback/note.tsx'
import { useToast } from '../../components/ui/feedback/toast-region.tsx'
import { PageTitle } from '../../components/ui/page-title.tsx'
import { Pairs } from '../../components/ui/pairs.tsx'
import { SideSection } from '../../components/ui/side-section.tsx'
import { refusalWords, refusedField } from '../../lib/refused-field.ts'

/** Who I am here, and my password. */
export function MePage() {
  const me = useMe()
  return (
    <>
      <title>Me and my password · Crosshead</title>
      <PageTitle title={me.name} under={<span>{me.email}</span>} />
      <div className="grid grid-cols-[minmax(0,1fr)_328px] items-start gap-12 max-list:grid-cols-1 max-list:gap-0">
        <SideSection title="Change my password"><ChangePassword email={me.email} /></SideSection>
        <div>
          <SideSection title="Me">
            <Pairs items={[['Role', capital(me.role)], [me.customerName ? 'Customer' : 'Site', me.place], ['Times', `in ${me.timeZone}`]]} />
            <p className="mt-3 text-13 text-quiet">Something wrong here? A manager of the lab can change it.</p>
          </SideSection>
          <SideSection title="Being signed in">
            <p>You stay signed in for 12 hours after the last touch, 7 days at most. On a shared bench screen it is half an hour: say so when you sign in there.</p>
            <p className="mt-3 text-13 text-quiet">At a shared bench everything is recorded under whoever is signed in. Sign out when you leave it.</p>
          </SideSection>
        </div>
      </div>
    </>
  )
}

function ChangePassword({ email }: { email: string }) {
  const say = useToast()
  const change = useChangePassword()
  const { register, handleSubmit, reset, formState: { errors } } = useForm({ resolver: zodResolver(changePassword.body), defaultValues: { current: '', next: '' } })
  const submit = handleSubmit((body) => change.mutate(body, {
    onSuccess: () => {
      reset()
      say({ text: 'Your password is changed. Everywhere else you are signed out.' })
    },
  }))
  const refused = refusalWords(change.error, ['current', 'next'])
  return (
    <form noValidate onSubmit={submit} className="grid max-w-[400px] gap-5">
      {refused && <Note kind="bad">{refused}</Note>}
      <input type="text" name="username" autoComplete="username" value={email} readOnly hidden />
      <PasswordField label="Present password" autoComplete="current-password" error={refusedField(change.error, 'current', errors.current)} {...register('current')} />
      <PasswordField label="New password" autoComplete="new-password" hint={passwordRules} error={refusedField(change.error, 'next', errors.next)} {...register('next')} />
      <p className="text-13 text-quiet">Afterwards you are signed out on every other screen.</p>
      <div><Button type="submit" kind="main" busy={change.isPending}>Change my password</Button></div>
    </form>
  )
}
