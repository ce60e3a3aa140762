import { describe, expect, it } from 'vitest'
import type { Plan } from '../../../shared/routing/plan.ts'
import { planShop } from '../../../shared/routing/plan-shop.ts'
import type { Shop } from '../../../shared/routing/shop.ts'
import { checkPlan } from './check-plan.ts'
import { contractShop } from './contract-shop.ts'

/** The contract's shop with a sample that must travel and one that a second person could attend. */
function shop(): Shop {
  const base = contractShop()
  base.steps.push(
    { id: 'c', sample: 'S2', kind: 'pull', after: [], setupMinutes: 5, runMinutes: 55, attended: 'all', needs: { forceKn: 300 }, scope: null },
    { id: 'd', sample: 'S3', kind: 'pull', after: [], setupMinutes: 5, runMinutes: 25, attended: 'all', needs: {}, scope: null, pin: { bench: 'T-frame-1' } },
  )
  base.samples.push({ id: 'S2', job: 'J1', site: 'T', availableFrom: 480 }, { id: 'S3', job: 'J1', site: 'T', availableFrom: 500 })
  return base
}

type Fault = { name: string; expected: RegExp; plant: (plan: Plan, shop: Shop) => void }
const at = (plan: Plan, step: string) => plan.entries.find((entry) => entry.step === step)!
const move = (plan: Plan, step: string, start: number) => {
  const entry = at(plan, step)
  Object.assign(entry, { start, end: start + entry.end - entry.start })
}
const faults: Fault[] = [
  { name: 'a bench that does another kind', expected: /does not do its kind/, plant: (plan) => void (at(plan, 'd').bench = 'T-lathe') },
  { name: 'a need outside the limits', expected: /outside the limits/, plant: (plan) => void (at(plan, 'c').bench = 'T-frame-1') },
  { name: 'a need that the bench does not list', expected: /outside the limits/, plant: (_, it) => void (it.steps[3]!.needs = { temperatureC: 20 }) },
  { name: 'a site without the scope', expected: /without its scope/, plant: (_, it) => void (it.sites[0]!.scope = []) },
  { name: 'a bench that is out', expected: /that is out/, plant: (_, it) => void (it.benches[0]!.out = true) },
  { name: 'calibration that ends before', expected: /ends after its bench is usable/, plant: (_, it) => void (it.benches[1]!.usableUntil = 600) },
  { name: 'authorisation that ends before', expected: /not authorised to its end/, plant: (_, it) => void (it.people[0]!.may[0]!.until = 529) },
  { name: 'a person of another site', expected: /person of another site/, plant: (plan) => void (at(plan, 'd').person = 'p2') },
  { name: 'no person', expected: /has no person/, plant: (plan) => void (at(plan, 'd').person = null) },
  { name: 'closed hours of the bench', expected: /open hours of its bench/, plant: (plan) => move(plan, 'd', 1000) },
  { name: 'closed hours of the person', expected: /hours of its person/, plant: (_, it) => void (it.people[0]!.open = [[500, 1020]]) },
  { name: 'two steps on one unit', expected: /holds two steps|holds more than/, plant: (plan) => move(plan, 'd', 595) },
  { name: 'a person at two steps', expected: /p1 does a and d at once/, plant: (plan) => move(plan, 'd', 500) },
  { name: 'the order of steps', expected: /starts before a ends/, plant: (plan) => move(plan, 'a', 590) },
  { name: 'a sample at two places', expected: /sample S1 is still taken/, plant: (plan) => move(plan, 'b', 520) },
  { name: 'no courier', expected: /S2 is at T, not at O/, plant: (plan) => void (plan.transfers = []) },
  { name: 'a courier that does not run', expected: /no courier from T to O at 970/, plant: (plan) => void Object.assign(plan.transfers[0]!, { depart: 970, arrive: 1090 }) },
  { name: 'a start before the courier arrives', expected: /S2 is still taken|S2 is at T/, plant: (plan) => move(plan, 'c', 960) },
  { name: 'a journey for nothing', expected: /travels without a later step/, plant: (plan) => void plan.transfers.push({ sample: 'S3', from: 'T', to: 'O', depart: 2400, arrive: 2520 }) },
  { name: 'another bench than pinned', expected: /not on its pinned bench/, plant: (plan) => void (at(plan, 'd').bench = 'O-frame-1') },
  { name: 'another start than pinned', expected: /does not start when pinned/, plant: (_, it) => void (it.steps[3]!.pin = { start: 777 }) },
  { name: 'another person than pinned', expected: /pinned person/, plant: (_, it) => void (it.steps[3]!.pin = { person: 'p2' }) },
  { name: 'a start before now', expected: /starts before now/, plant: (plan) => move(plan, 'a', 479) },
  { name: 'a start before the sample is there', expected: /before its sample is available/, plant: (_, it) => void (it.samples[2]!.availableFrom = 700) },
  { name: 'a frozen step moved', expected: /moved out of the frozen window/, plant: (plan) => move(plan, 'b', 660) },
  { name: 'a started step moved', expected: /is started and was changed/, plant: (_, it) => void Object.assign(it.steps[0]!, { state: 'started', actual: { bench: 'T-lathe', person: 'p1', start: 470 } }) },
  { name: 'an end after the horizon', expected: /after the horizon/, plant: (_, it) => void (it.horizon = 600) },
  { name: 'a wrong length', expected: /wrong length/, plant: (plan) => void (at(plan, 'd').end += 1) },
  { name: 'a step forgotten', expected: /neither placed nor unplaced/, plant: (plan) => void plan.entries.pop() },
  { name: 'a step placed without what it waits for', expected: /placed without a/, plant: (plan) => {
    plan.entries = plan.entries.filter(({ step }) => step !== 'a')
    plan.unplaced = [{ step: 'a', because: 'planted', cures: ['none'] }]
  } },
  { name: 'tardiness told wrongly', expected: /not as told/, plant: (plan) => void (plan.jobs[0]!.tardiness = 5) },
  { name: 'a bound above the plan', expected: /lower bound/, plant: (plan) => void (plan.totals.lowerBound = 1) },
]

describe('the independent checker', () => {
  it('finds nothing in a sound plan', () => {
    expect(checkPlan(shop(), planShop(shop()))).toEqual([])
    expect(planShop(shop()).transfers).toHaveLength(1)
  })

  it.each(faults)('catches $name', ({ expected, plant }) => {
    const changed = shop()
    const plan = planShop(shop())
    plant(plan, changed)
    expect(checkPlan(changed, plan).join('\n')).toMatch(expected)
  })
})
