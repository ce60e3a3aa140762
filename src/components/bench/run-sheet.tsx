import { Suspense, useDeferredValue, useMemo, useState } from 'react'
import type { TestRun } from '../../../shared/api/test-runs.ts'
import { checkEntry } from '../../../shared/method/check-entry.ts'
import type { Entry } from '../../../shared/method/entries.ts'
import { formFields } from '../../../shared/method/form.ts'
import type { Method } from '../../../shared/method/method.ts'
import { useMe } from '../../api/session.ts'
import { useAddRecord, useRecordRun, useStopRun } from '../../api/test-runs.ts'
import { after } from '../../lib/after.ts'
import { formatDay } from '../../lib/format.ts'
import { counting, sheetReadings, type SheetReading } from '../../lib/kept-readings/sheet-readings.ts'
import { useTyped } from '../../lib/kept-readings/use-typed.ts'
import { evaluateLive } from '../../methods/evaluate-live.ts'
import { isHalfTyped, pendingEntries } from '../../methods/pending-entries.ts'
import type { Live, SheetViewProps } from '../../methods/sheet-view.ts'
import { viewOf } from '../../methods/views.ts'
import { Button } from '../ui/buttons/button.tsx'
import { useKeys } from '../ui/buttons/use-keys.ts'
import { useToast } from '../ui/feedback/toast-region.tsx'
import { KeptSign } from './kept-sign.tsx'
import { RemarkField } from './remark-field.tsx'
import { SheetFoot } from './sheet-foot.tsx'
import { SheetHead } from './sheet-head.tsx'
import { StopDialog } from './dialogs/stop-dialog.tsx'
import { stopperOf } from './stopper-of.ts'
import { StrikeDialog } from './dialogs/strike-dialog.tsx'
import { useReadingQueue } from './use-reading-queue.ts'

type Asked = { key: string; entry?: Entry; refill?: Record<string, string> | undefined }

/** The sheet of a run: its head, the method's view of the readings, and the deeds. Key it by the run. */
export function RunSheet({ run, method, onRecorded, onStopped }: { run: TestRun; method: Method; onRecorded: () => void; onStopped: () => void }) {
  const me = useMe()
  const say = useToast()
  const [queue, state] = useReadingQueue(run)
  const [typed, type, clearTyped] = useTyped(run.id)
  const [asked, setAsked] = useState<Asked>()
  const [stopping, setStopping] = useState(false)
  const record = useRecordRun(run.id)
  const stop = useStopRun(run.id)
  const addRecord = useAddRecord(run.id)
  const readings = useMemo(() => sheetReadings(state.kept, state), [state])
  const entries = useMemo((): Entry[] => [...counting(readings), ...pendingEntries(method, typed, readings)].map(({ path, value }) => ({ path, value })), [method, typed, readings])
  const shown = useDeferredValue(entries)
  const live = useMemo(() => liveOf(method, run, shown), [method, run, shown])
  const locked = run.state !== 'open' ? `This run is ${run.state}.` : run.performedById !== me.id ? `${run.performedBy} carries out this run.` : ''
  const View = viewOf(method)

  const without = (key: string) => {
    const rest = counting(readings).filter((reading) => reading.key !== key).map(({ path, value }) => ({ path, value }))
    return evaluateLive(method, run, rest).results.find((result) => result.key === method.mainResult)
  }
  const strike = (reason: string) => {
    if (!asked) return
    const { key, entry, refill } = asked
    void queue.change(entry ? [entry] : [], [{ key, reason }])
    type({ ...(entry && { [entry.path]: '' }), ...refill })
    setAsked(undefined)
  }
  const sheet: SheetViewProps = {
    method, run, readings, live, typed, type, locked, without,
    keep: (kept) => void queue.change(kept),
    strike: (key, refill) => setAsked({ key, refill }),
    replace: (key, entry) => setAsked({ key, entry }),
    settle: {
      keepAs: (key, path) => void queue.move(key, path), drop: (key) => void queue.drop(key),
      useMine: (_mine, other) => void queue.change([], [{ key: other, reason: 'another screen kept another value; the other one counts' }]),
    },
    addRecord: async (file, onProgress) => { await addRecord.mutateAsync({ file, onProgress }) },
  }
  const warnings = live.checks.filter(({ severity }) => severity === 'warning')
  const remark = typed['remark'] ?? ''
  const stopper = stopperOf({ live, state, isHalfTyped: isHalfTyped(method, typed), isBehind: shown !== entries, needsRemark: warnings.length > 0 && remark.trim() === '' })
  const recordNow = () => {
    if (stopper || locked || record.isPending) return
    after(record.mutateAsync({ version: run.version, remark: remark.trim() }), () => {
      clearTyped()
      say({ text: `${run.sampleNumber}, ${method.label(run.parameters)}: recorded, waits for review.` })
      onRecorded()
    })
  }
  useKeys({ 'ctrl enter': recordNow })
  const refusal = record.error?.message
  return (
    <div data-sheet="" className="flex min-w-0 flex-1 flex-col">
      <SheetHead
        sample={{ ...run, number: run.sampleNumber }} title={method.label(run.parameters)} summary={method.summary(run.parameters)} equipment={run.equipment} zone={run.timeZone}
        lines={<p className="text-13">{run.performedBy}{run.authorisedUntil ? `, authorised until ${formatDay(run.authorisedUntil, 'full')}` : ', authorisation has ended'}{run.number > 1 && `; run ${run.number}`}</p>}
      />
      {locked && <p role="status" className="border-b border-line bg-wash px-10 py-2.5 text-15 max-desk:px-gutter">{locked} {run.state === 'recorded' && 'It waits for review.'} Its readings stay as they are.</p>}
      <Suspense fallback={<p role="status" className="p-10 text-quiet">Loading the sheet</p>}>
        <View {...sheet} />
      </Suspense>
      {(warnings.length > 0 || remark !== '' || (locked && run.remark)) && (
        <RemarkField value={locked ? run.remark : remark} onValue={(text) => type({ remark: text })} isNeeded={warnings.length > 0} readOnly={Boolean(locked)} error={record.error && 'fields' in record.error ? fieldOf(record.error, 'remark') : undefined} />
      )}
      <SheetFoot
        kept={locked && state.unsent.length === 0 ? undefined : <KeptSign state={state} zone={run.timeZone} onRetry={() => void queue.retry()} />} cautions={method.cautions(run.parameters)}
        stopperId="stopper" isCalm={!refusal && live.failure === '' && !live.checks.some(({ severity }) => severity === 'error')} stopper={locked ? undefined : (refusal ? sentence(refusal) : stopper)}
      >
        {!locked && <Button kind="soft" size="big" onClick={() => setStopping(true)}>Stop run</Button>}
        {!locked && <Button kind="main" size="big" keys="Ctrl Enter" busy={record.isPending} refusal={stopper} refusalAt="hidden" onClick={recordNow}>Record run</Button>}
      </SheetFoot>
      {asked && <StrikeDialog what={nameOf(method, readings, asked.key)} replacing={asked.entry !== undefined} onStrike={strike} onClose={() => setAsked(undefined)} />}
      {stopping && (
        <StopDialog
          busy={stop.isPending} error={stop.error?.message} onClose={() => setStopping(false)}
          onStop={(reason) => after(stop.mutateAsync({ version: run.version, reason }), () => { clearTyped(); setStopping(false); say({ text: `${run.sampleNumber}: run stopped. The test is ready for another.` }); onStopped() })}
        />
      )}
    </div>
  )
}

/** A recorded run shows what was recorded, whatever the formulas say today. */
function liveOf(method: Method, run: TestRun, entries: readonly Entry[]): Live {
  const live = evaluateLive(method, run, entries)
  return run.evaluation ? { ...live, ...run.evaluation, verdict: run.evaluation.verdict, failure: '' } : live
}

/** "reading 4, 31.9" as the strike dialog names it. */
function nameOf(method: Method, readings: readonly SheetReading[], key: string): string {
  const reading = readings.find((one) => one.key === key)
  if (!reading) return 'the reading'
  const [column] = formFields(method.readings)
  const first: unknown = method.isSet && column && typeof reading.value === 'object' && reading.value !== null ? Reflect.get(reading.value, column.name) : reading.value
  const number = method.isSet ? `reading ${Number(reading.path.split('.')[1]) + 1}` : 'the value'
  return checkEntry(method, reading.path, reading.value) === null && (typeof first === 'number' || typeof first === 'string') ? `${number}, ${first}` : number
}

function fieldOf(error: Error, name: string): string | undefined {
  const fields: unknown = Reflect.get(error, 'fields')
  const said: unknown = typeof fields === 'object' && fields !== null ? Reflect.get(fields, name) : undefined
  return typeof said === 'string' ? said : undefined
}

function sentence(text: string): string {
  const said = text.charAt(0).toUpperCase() + text.slice(1)
  return /[.!?]$/.test(said) ? said : `${said}.`
}
