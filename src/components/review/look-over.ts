import type { TestRun } from '../../../shared/api/test-runs.ts'
import { evaluate, isRefused } from '../../../shared/evaluate.ts'
import { inputOf } from '../../../shared/method/entries.ts'
import type { Evaluation, Result } from '../../../shared/method/method.ts'
import { methodOf } from '../../../shared/methods.ts'
import { calendarDay, formatDay, formatWhen } from '../../lib/format.ts'
import { asSentence } from '../../lib/refused-field.ts'

/** Something that a reviewer should stop at: `bad` speaks against the run, `warn` wants a thought, `plain` is worth knowing. */
export type Unusual = { kind: 'bad' | 'warn' | 'plain'; title: string; text?: string; list?: readonly string[] }
export type LookedOver = { unusual: Unusual[]; inOrder: string[] }

/** Everything that is looked at before a run is accepted: what is unusual first, and what was found in order. */
export function lookOver(run: TestRun): LookedOver {
  const found = [...ofRules(run), ofRequirement(run), ofStrikes(run), ofRemark(run), ofCalibration(run), ofVerification(run), ofPerson(run), ofEarlier(run), ofSecondCalculation(run)].filter((one) => one !== undefined)
  const order = { bad: 0, warn: 1, plain: 2 }
  const unusual = found.filter((one) => typeof one !== 'string').sort((a, b) => order[a.kind] - order[b.kind])
  return { unusual, inOrder: found.filter((one) => typeof one === 'string') }
}

function ofRules({ evaluation, methodId }: TestRun): (Unusual | string)[] {
  const title = methodOf(methodId)?.title ?? methodId
  if (!evaluation) return [{ kind: 'bad', title: 'There are no results on record.' }]
  const kinds = { error: 'bad', warning: 'warn', info: 'plain' } as const
  const broken = evaluation.checks.map(({ severity, message }): Unusual => ({ kind: kinds[severity], title: asSentence(message) }))
  return broken.some(({ kind }) => kind !== 'plain') ? broken : [...broken, `No rule of ${title} broken`]
}

function ofRequirement({ evaluation, requirement }: TestRun): Unusual | string {
  if (!requirement || requirement.limits.length === 0) return 'No limits to hold it against'
  const outcome = evaluation?.verdict?.outcome
  if (outcome === 'pass') return 'Requirement met'
  if (outcome === 'fail') return { kind: 'warn', title: 'It does not meet the requirement.', text: 'That is a result like any other; look twice that nothing at the bench made it.' }
  return { kind: 'warn', title: 'The requirement is undecided.', text: requirement.rule === 'guarded' ? 'A result is missing or too close to its limit for its uncertainty.' : 'A result that a limit asks for is missing.' }
}

function ofStrikes({ readings, timeZone }: TestRun): Unusual | string {
  const struck = readings.flatMap((reading) => (reading.struck ? [reading.struck] : []))
  if (struck.length === 0) return 'Nothing struck out'
  return {
    kind: 'warn', title: struck.length === 1 ? 'One reading is struck out.' : `${struck.length} readings are struck out.`,
    list: struck.map(({ reason, by, at }) => `${asSentence(reason)} ${by}, ${formatWhen(at, 'short', { zone: timeZone })}`),
  }
}

function ofRemark({ remark, performedBy }: TestRun): Unusual | string {
  return remark === '' ? 'No remark from the bench' : { kind: 'plain', title: `${performedBy} remarks:`, text: remark }
}

function ofCalibration({ equipment, startedAt, timeZone }: TestRun): Unusual | string | undefined {
  if (!equipment) return undefined
  if (equipment.outOfUse) return { kind: 'warn', title: `${equipment.code} is out of use now.`, text: 'Find out whether what is wrong with it was wrong during this run.' }
  if (!equipment.calibratedUntil) return { kind: 'bad', title: `${equipment.code} has no calibration on record.` }
  const until = formatDay(equipment.calibratedUntil, 'full')
  return equipment.calibratedUntil < calendarDay(startedAt, timeZone) ? { kind: 'bad', title: `The calibration of ${equipment.code} had ended.`, text: `It was good until ${until}.` } : `${equipment.code} calibrated until ${until}`
}

function ofVerification({ equipment, timeZone }: TestRun): Unusual | string | undefined {
  const last = equipment?.lastVerification
  if (!equipment || !last) return undefined
  const when = formatWhen(last.at, 'week', { zone: timeZone })
  return last.passed ? `${equipment.code} verified ${when}` : { kind: 'bad', title: `The last verification of ${equipment.code} failed.`, text: `${when}: ${last.text}` }
}

function ofPerson({ performedBy, authorisedUntil, methodId }: TestRun): Unusual | string {
  const title = methodOf(methodId)?.title ?? methodId
  return authorisedUntil ? `${performedBy} authorised until ${formatDay(authorisedUntil, 'full')}` : { kind: 'bad', title: `${performedBy} is not authorised to carry out ${title} today.`, text: 'A run is accepted only while that authorisation lasts.' }
}

function ofEarlier({ reviews, timeZone, state }: TestRun): Unusual | undefined {
  const back = reviews.filter(({ outcome }) => outcome === 'sent back')
  if (back.length === 0) return undefined
  return { kind: state === 'recorded' ? 'warn' : 'plain', title: 'It was sent back.', list: back.map(({ remark, by, at }) => `${asSentence(remark)} ${by}, ${formatWhen(at, 'short', { zone: timeZone })}`) }
}

/** The browser works the run out again from its readings; the formulas are the same, the machine is another. */
function ofSecondCalculation(run: TestRun): Unusual | string | undefined {
  const method = methodOf(run.methodId)
  if (!method || !run.evaluation) return undefined
  if (method.version !== run.methodVersion) return { kind: 'plain', title: `Worked out by version ${run.methodVersion} of ${method.title}.`, text: `Version ${method.version} is in use now; what is on record stays as it was.` }
  const again = evaluate({ method: method.id, ...inputOf(run.parameters, run.readings.filter(({ struck }) => !struck), method.isSet), ...(run.requirement && run.requirement.limits.length > 0 && { requirement: run.requirement }) })
  const results: readonly Result[] = isRefused(again) || !('results' in again) ? [] : (again as Evaluation).results
  const differ = run.evaluation.results.filter(({ key, reported }) => results.find((one) => one.key === key)?.reported !== reported)
  return differ.length === 0 ? 'Worked out again here, same results' : { kind: 'bad', title: 'Worked out again here, some results differ.', list: differ.map(({ key, symbol, reported }) => `${symbol}: on record ${reported}, here ${results.find((one) => one.key === key)?.reported ?? 'nothing'}`) }
}
