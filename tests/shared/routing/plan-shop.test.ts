import { describe, expect, it } from 'vitest'
import { planShop } from '../../../shared/routing/plan-shop.ts'
import { promiseFor } from '../../../shared/routing/promise-for.ts'
import { checkPlan } from './check-plan.ts'
import { contractShop } from './contract-shop.ts'

const placement = (shop: ReturnType<typeof contractShop>, step: string) => {
  const entry = planShop(shop).entries.find((each) => each.step === step)
  return entry && [entry.bench, entry.person, entry.start, entry.end]
}
/** Step b without its pin and its earlier place. */
const freeShop = () => {
  const shop = contractShop()
  delete shop.steps[1]!.pin
  delete shop.steps[1]!.previous
  return shop
}

describe('the plan of a shop', () => {
  it('answers the example of the contract as the contract does', () => {
    const plan = planShop(contractShop())
    expect(placement(contractShop(), 'a')).toEqual(['T-lathe', 'p1', 480, 530])
    expect(placement(contractShop(), 'b')).toEqual(['T-frame-1', 'p1', 600, 620])
    expect(plan).toMatchObject({ transfers: [], unplaced: [], jobs: [{ id: 'J1', finish: 620, tardiness: 0 }], totals: { weightedTardiness: 0, transfers: 0, lowerBound: 0 } })
    expect(checkPlan(contractShop(), plan)).toEqual([])
  })

  it('lets a step go once the frozen window has passed it', () => {
    const shop = contractShop()
    shop.frozenMinutes = 120
    expect(placement(shop, 'b')).toEqual(['T-frame-1', 'p1', 530, 550])
  })

  it('moves a frozen step whose bench is out of use', () => {
    const shop = contractShop()
    delete shop.steps[1]!.pin
    shop.steps[1]!.scope = null
    shop.benches[1]!.out = true
    expect(placement(shop, 'b')).toEqual(['O-frame-1', 'p2', 1920, 1940])
  })

  it('moves a frozen step when what it waits for cannot be done before it', () => {
    const shop = contractShop()
    shop.steps[0]!.runMinutes = 200
    expect(placement(shop, 'b')).toEqual(['T-frame-1', 'p1', 690, 710])
    expect(checkPlan(shop, planShop(shop))).toEqual([])
  })

  it('sends a sample by courier where only the other site can do the step', () => {
    const shop = freeShop()
    Object.assign(shop.steps[1]!, { needs: { forceKn: 400 }, scope: null })
    const plan = planShop(shop)
    expect(plan.transfers).toEqual([{ sample: 'S1', from: 'T', to: 'O', depart: 960, arrive: 1080 }])
    expect(placement(shop, 'b')).toEqual(['O-frame-1', 'p2', 1920, 1940])
  })

  it('sends a sample over a third site, one transfer per leg', () => {
    const shop = freeShop()
    Object.assign(shop.steps[1]!, { needs: { forceKn: 400 }, scope: null })
    shop.sites[0]!.courier = [{ to: 'W', departures: [600], minutes: 60 }]
    shop.sites.push({ id: 'W', scope: [], courier: [{ to: 'O', departures: [500, 660, 700], minutes: 30 }] })
    const plan = planShop(shop)
    expect(plan.transfers.map(({ from, to, depart, arrive }) => [from, to, depart, arrive])).toEqual([['T', 'W', 600, 660], ['W', 'O', 660, 690]])
    expect(placement(shop, 'b')).toEqual(['O-frame-1', 'p2', 690, 710])
  })

  it('says why a step has no place, what would help, and what depends on it', () => {
    const shop = freeShop()
    shop.steps[1]!.needs = { forceKn: 700 }
    shop.steps.push({ ...shop.steps[0]!, id: 'c', after: ['b'] })
    const { unplaced, jobs } = planShop(shop)
    expect(unplaced.map(({ step }) => step)).toEqual(['b', 'c'])
    expect(unplaced[0]!.because).toContain('no bench takes forceKn 700')
    expect(unplaced[0]!.cures).toContain('Add a bench that takes forceKn 700')
    expect(unplaced[1]!.because).toContain('waits for b')
    expect(jobs).toEqual([{ id: 'J1', finish: 20160, tardiness: 20160 - 2880 }])
  })

  it('explains the choice and names the rule that ruled a bench out', () => {
    const why = planShop(contractShop()).entries[1]!.why
    expect(why?.chosen).toContain('frozen window')
    expect(why?.rejected).toEqual([{ bench: 'O-frame-1', because: 'site O does not have tensile in its scope' }])
  })

  it('holds the bench of a started step and waits for its end', () => {
    const shop = freeShop()
    Object.assign(shop.steps[0]!, { state: 'started', actual: { bench: 'T-lathe', person: 'p1', start: 470 } })
    expect(placement(shop, 'a')).toEqual(['T-lathe', 'p1', 470, 520])
    expect(placement(shop, 'b')).toEqual(['T-frame-1', 'p1', 520, 540])
  })

  it('takes the ends of authorisation and calibration as inclusive', () => {
    const shop = freeShop()
    shop.people[0]!.may[1]!.until = 550
    shop.benches[1]!.usableUntil = 550
    expect(placement(shop, 'b')).toEqual(['T-frame-1', 'p1', 530, 550])
    shop.people[0]!.may[1]!.until = 549
    expect(placement(shop, 'b')).toBeUndefined()
  })

  it('does not run an attended step across a closing time, but an unattended run may', () => {
    const shop = freeShop()
    shop.samples[0]!.availableFrom = 1000
    expect(placement(shop, 'a')).toEqual(['T-lathe', 'p1', 1920, 1970])
    shop.steps[0]!.attended = 'setup'
    expect(placement(shop, 'a')).toEqual(['T-lathe', 'p1', 1000, 1050])
  })

  it('promises finish and slack of one job', () => {
    expect(promiseFor(contractShop(), 'J1')).toEqual({ finish: 620, slack: 2260 })
    expect(() => promiseFor(contractShop(), 'J9')).toThrow(RangeError)
  })
})
