import { describe, expect, it } from 'vitest'
import { planInput } from '../../../shared/routing/plan-input.ts'
import { contractShop } from './contract-shop.ts'

/** Input of any shape, as it comes from outside. */
type Loose = ReturnType<typeof JSON.parse>
const broken: [name: string, path: (string | number)[], spoil: (shop: Loose) => void][] = [
  ['an unknown key', ['steps', 0], (shop) => (shop.steps[0].colour = 'red')],
  ['a missing key', ['effort'], (shop) => delete shop.effort],
  ['a fraction of a minute', ['steps', 0, 'runMinutes'], (shop) => (shop.steps[0].runMinutes = 1.5)],
  ['a negative length', ['steps', 0, 'runMinutes'], (shop) => (shop.steps[0].runMinutes = -1)],
  ['a negative weight', ['jobs', 0, 'weight'], (shop) => (shop.jobs[0].weight = -1)],
  ['a reversed interval', ['benches', 0, 'open', 0], (shop) => (shop.benches[0].open = [[20, 10]])],
  ['intervals that touch', ['people', 0, 'open', 1], (shop) => (shop.people[0].open = [[0, 10], [10, 20]])],
  ['reversed limits', ['benches', 1, 'does', 0, 'limits', 'forceKn'], (shop) => (shop.benches[1].does[0].limits.forceKn = [9, 1])],
  ['a need that is no number', ['steps', 1, 'needs', 'forceKn'], (shop) => (shop.steps[1].needs.forceKn = '83')],
  ['an id given twice', ['steps', 1, 'id'], (shop) => (shop.steps[1].id = 'a')],
  ['an unknown sample', ['steps', 0, 'sample'], (shop) => (shop.steps[0].sample = 'S9')],
  ['an unknown pinned bench', ['steps', 1, 'pin', 'bench'], (shop) => (shop.steps[1].pin.bench = 'X')],
  ['a circle of steps', ['steps', 0, 'after'], (shop) => (shop.steps[0].after = ['b'])],
  ['a step that waits for itself', ['steps', 0, 'after'], (shop) => (shop.steps[0].after = ['a'])],
  ['an attended set-up of no length', ['steps', 0, 'setupMinutes'], (shop) => Object.assign(shop.steps[0], { attended: 'setup', setupMinutes: 0 })],
  ['a state without actual', ['steps', 0, 'actual'], (shop) => (shop.steps[0].state = 'started')],
  ['an actual without state', ['steps', 0, 'state'], (shop) => (shop.steps[0].actual = { bench: 'T-lathe', person: 'p1', start: 1 })],
  ['an actual start after now', ['steps', 0, 'actual', 'start'], (shop) => Object.assign(shop.steps[0], { state: 'started', actual: { bench: 'T-lathe', person: 'p1', start: 481 } })],
  ['a started step with an end', ['steps', 0, 'actual', 'end'], (shop) => Object.assign(shop.steps[0], { state: 'started', actual: { bench: 'T-lathe', person: 'p1', start: 1, end: 2 } })],
]

describe('input to the planner', () => {
  it.each(broken)('refuses %s and says where', (_, path, spoil) => {
    const shop = contractShop()
    spoil(shop)
    const answer = planInput(shop)
    expect('error' in answer && answer.error.code).toBe('invalid-input')
    expect('error' in answer && answer.error.issues.map((issue) => issue.path)).toContainEqual(path)
  })

  it('ignores unknown references in an earlier placement', () => {
    const shop = contractShop()
    shop.steps[1]!.previous = { bench: 'gone', person: 'gone', start: 600 }
    const answer = planInput(shop)
    expect('entries' in answer && answer.entries[1]?.start).toBe(530)
  })

  it('plans a shop with empty lists', () => {
    const answer = planInput({ now: 0, frozenMinutes: 0, horizon: 10, effort: 0, sites: [], benches: [], people: [], jobs: [], samples: [], steps: [] })
    expect(answer).toEqual({ entries: [], transfers: [], unplaced: [], jobs: [], totals: { weightedTardiness: 0, transfers: 0, loadSpread: 0, lowerBound: 0 } })
  })

  it.each([null, 3, 'shop', [], {}])('refuses %j', (input) => {
    expect(planInput(input)).toHaveProperty('error.code', 'invalid-input')
  })
})
