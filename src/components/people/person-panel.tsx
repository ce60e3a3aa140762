import { useState } from 'react'
import { placeOf } from '../../../shared/access/place-of.ts'
import type { Person } from '../../../shared/api/people.ts'
import { useDisablePerson, useInvitePerson } from '../../api/people.ts'
import { useMe } from '../../api/session.ts'
import { formatWhen } from '../../lib/format.ts'
import { refusalWords } from '../../lib/refused-field.ts'
import { Button } from '../ui/buttons/button.tsx'
import { Dialog } from '../ui/feedback/dialog.tsx'
import { useToast } from '../ui/feedback/toast-region.tsx'
import { Pairs } from '../ui/pairs.tsx'
import { AuthorisationList } from './authorisation-list.tsx'
import { capital } from './capital.ts'
import { GrantForm } from './grant-form.tsx'
import { placeWords } from './place-words.ts'

/** One person: what they may do until when, a new right, and the end of their access. */
export function PersonPanel({ person }: { person: Person }) {
  const isOfSite = placeOf(person.role) !== 'customer'
  return (
    <div className="grid gap-6">
      <Pairs className="text-13" items={[['Email', <span className="break-words">{person.email}</span>], ['Role', capital(person.role)], [isOfSite ? 'Site' : 'Customer', placeWords(person)], ['Last sign-in', person.lastSignInAt ? formatWhen(person.lastSignInAt, 'full') : 'never']]} />
      {person.state === 'invited' && <SendAgain person={person} />}
      {isOfSite && (
        <section aria-label="Authorisations" className="grid gap-3 border-t border-line pt-3">
          <h3 className="font-medium">Authorised for</h3>
          <AuthorisationList full authorisations={person.authorisations} />
          {person.state !== 'disabled' && person.siteId && <div className="mt-2"><GrantForm key={person.id} person={person} /></div>}
          {!person.siteId && <p className="text-13 text-quiet">Rights are kept site by site. {person.name} belongs to all of them, so these are set up with the sites.</p>}
        </section>
      )}
      {person.state === 'disabled' ? <p className="border-t border-line pt-3 text-quiet">Access has ended. What {person.name} did stays under this name.</p> : <EndAccess person={person} />}
    </div>
  )
}

function SendAgain({ person }: { person: Person }) {
  const invite = useInvitePerson()
  const say = useToast()
  const { name, email, role, siteId, customerId } = person
  return (
    <div>
      <Button kind="soft" icon="mail" busy={invite.isPending} onClick={() => invite.mutate({ name, email, role, siteId, customerId }, { onSuccess: () => say({ text: `A new link goes to ${email}. The one before no longer works.` }), onError: (error) => say({ kind: 'bad', text: error.message }) })}>Send the invitation again</Button>
    </div>
  )
}

function EndAccess({ person }: { person: Person }) {
  const me = useMe()
  const say = useToast()
  const disable = useDisablePerson()
  const [open, setOpen] = useState(false)
  const end = () => disable.mutate({ personId: person.id, version: person.version }, {
    onSuccess: () => {
      setOpen(false)
      say({ text: `The access of ${person.name} has ended.` })
    },
  })
  return (
    <div className="border-t border-line pt-4">
      <Button kind="danger" refusal={person.id === me.id && 'You cannot end your own access; ask another manager.'} refusalAt="below" onClick={() => { disable.reset(); setOpen(true) }}>End access…</Button>
      <Dialog open={open} onOpenChange={setOpen} danger title={`End the access of ${person.name}?`} confirm="End access" busy={disable.isPending} error={refusalWords(disable.error)} onConfirm={end}>
        <p>They are signed out everywhere at once, and links sent to them stop working. What they did stays under their name. It cannot be undone here; they would be invited anew with another address.</p>
      </Dialog>
    </div>
  )
}
