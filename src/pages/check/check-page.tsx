import { zodResolver } from '@hookform/resolvers/zod'
import { useQuery } from '@tanstack/react-query'
import { useForm } from 'react-hook-form'
import { Link, useSearchParams } from 'react-router-dom'
import * as z from 'zod'
import { reportCheckQuery } from '../../api/reports.ts'
import { sessionQuery } from '../../api/session.ts'
import { CheckAnswer } from '../../components/check/check-answer.tsx'
import { PageFrame } from '../../components/shell/page-frame.tsx'
import { StripBar } from '../../components/shell/strip.tsx'
import { Button } from '../../components/ui/buttons/button.tsx'
import { Note } from '../../components/ui/feedback/note.tsx'
import { TextField } from '../../components/ui/fields/text-field.tsx'
import { refusalWords, refusedField } from '../../lib/refused-field.ts'

const asked = (where: string) => z.string().trim().min(1, `is needed; it stands ${where}`).max(40, 'at most 40 characters')
const Asked = z.strictObject({ number: asked('at the top of every page'), code: asked('beside the square on the first page').transform((code) => code.toUpperCase()) })

/** For whoever holds a report: is it real, does it still count, is the file unchanged. Number and code are in the address, as the report's square has them. */
export function CheckPage() {
  const [address, setAddress] = useSearchParams()
  const question = { number: address.get('number') ?? '', code: address.get('code') ?? '' }
  const check = useQuery(reportCheckQuery(question))
  const session = useQuery(sessionQuery)
  const { register, handleSubmit, formState: { errors } } = useForm({ resolver: zodResolver(Asked), values: question })
  const submit = handleSubmit((next) => (next.number === question.number && next.code === question.code ? void check.refetch() : setAddress(next)))
  const refused = refusalWords(check.error, ['number', 'code'])
  return (
    <PageFrame
      layout="bare"
      strip={<StripBar here={session.data?.company ?? 'Report check'}><Link to={session.data?.me ? '/' : '/sign-in'} className="ml-auto self-center py-3">{session.data?.me ? 'Back to work' : 'Sign in'}</Link></StripBar>}
    >
      <title>Check a report · Crosshead</title>
      <div className="mx-auto max-w-[808px] px-6 pt-14 pb-20 max-tablet:px-gutter max-tablet:pt-7 max-tablet:pb-12">
        <h1 className="mb-5 text-26 font-medium tracking-[-.014em]">Check a report</h1>
        <form noValidate onSubmit={submit} className="mb-12 grid grid-cols-[1fr_1fr_auto] items-start gap-4 [--control:2.75rem] max-tablet:grid-cols-1 max-tablet:mb-9">
          <TextField label="Report number" mono placeholder="R-26-00391/2" error={refusedField(check.error, 'number', errors.number)} {...register('number')} />
          <TextField label="Code" mono autoCapitalize="characters" spellCheck={false} error={refusedField(check.error, 'code', errors.code)} {...register('code')} />
          <Button type="submit" size="big" busy={check.isFetching} className="tablet:mt-5.5 text-15!">Check</Button>
        </form>
        {refused && <Note kind="bad" className="mb-9">{refused}</Note>}
        {check.data && <CheckAnswer check={check.data} />}
        {!check.data && !check.error && !check.isFetching && (
          <p className="max-w-[560px] text-quiet">Number and code are on the first page of every report. The square there holds both: point a phone at it and this page opens with the answer.</p>
        )}
      </div>
    </PageFrame>
  )
}
