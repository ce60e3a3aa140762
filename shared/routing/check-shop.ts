import type { Shop, Step } from './shop.ts'
import { findCircle } from './layout/find-circle.ts'

export type ShopIssue = { path: (string | number)[]; message: string }

/** What is wrong with a shop beyond the shape of its records: ids given twice, unknown references, circles, states that contradict. */
export function checkShop(shop: Shop): ShopIssue[] {
  const issues: ShopIssue[] = []
  const add = (path: (string | number)[], message: string) => void issues.push({ path, message })
  const ids = (list: 'sites' | 'benches' | 'people' | 'jobs' | 'samples' | 'steps') => {
    const seen = new Set<string>()
    shop[list].forEach(({ id }, i) => {
      if (seen.has(id)) add([list, i, 'id'], `'${id}' is given twice`)
      seen.add(id)
    })
    return seen
  }
  const known = { sites: ids('sites'), benches: ids('benches'), people: ids('people'), jobs: ids('jobs'), samples: ids('samples'), steps: ids('steps') }
  const refers = (list: keyof typeof known, id: string | null | undefined, path: (string | number)[]) => {
    if (id != null && !known[list].has(id)) add(path, `'${id}' is not among the ${list}`)
  }

  if (shop.horizon < shop.now) add(['horizon'], `must not be before now (${shop.now})`)
  shop.sites.forEach((site, i) => site.courier.forEach((courier, j) => refers('sites', courier.to, ['sites', i, 'courier', j, 'to'])))
  shop.benches.forEach((bench, i) => refers('sites', bench.site, ['benches', i, 'site']))
  shop.people.forEach((person, i) => refers('sites', person.site, ['people', i, 'site']))
  shop.samples.forEach((sample, i) => {
    refers('jobs', sample.job, ['samples', i, 'job'])
    refers('sites', sample.site, ['samples', i, 'site'])
  })
  shop.steps.forEach((step, i) => {
    const path = ['steps', i]
    refers('samples', step.sample, [...path, 'sample'])
    step.after.forEach((id, j) => refers('steps', id, [...path, 'after', j]))
    refers('benches', step.pin?.bench, [...path, 'pin', 'bench'])
    refers('people', step.pin?.person, [...path, 'pin', 'person'])
    refers('benches', step.actual?.bench, [...path, 'actual', 'bench'])
    refers('people', step.actual?.person, [...path, 'actual', 'person'])
    for (const [where, message] of stepFaults(step, shop.now)) add([...path, ...where], message)
  })
  const circle = findCircle(shop.steps)
  if (circle) add(['steps', circle.at, 'after'], `steps wait for one another in a circle: ${circle.steps.join(', ')}`)
  return issues
}

function stepFaults(step: Step, now: number): [string[], string][] {
  const faults: [string[], string][] = []
  const { attended, pin, state, actual } = step
  if (attended === 'setup' && step.setupMinutes < 1) faults.push([['setupMinutes'], 'must be 1 or more where the set-up is attended'])
  if (attended === 'none' && pin?.person != null) faults.push([['pin', 'person'], 'a step that nobody attends takes no person'])
  if (attended !== 'none' && pin?.person === null) faults.push([['pin', 'person'], 'an attended step needs a person'])
  if (state && !actual) faults.push([['actual'], `a step that is ${state} must say where and when`])
  if (actual && !state) faults.push([['state'], 'a step with an actual start must be started or done'])
  if (!actual) return faults
  if (attended === 'none' && actual.person !== null) faults.push([['actual', 'person'], 'must be null for a step that nobody attends'])
  if (attended !== 'none' && actual.person === null) faults.push([['actual', 'person'], 'an attended step has a person'])
  if (actual.start > now) faults.push([['actual', 'start'], `must not be after now (${now})`])
  if (state === 'started' && actual.end !== undefined) faults.push([['actual', 'end'], 'a step that has ended is done, not started'])
  if (state === 'done' && actual.end === undefined) faults.push([['actual', 'end'], 'a step that is done has an end'])
  if (actual.end !== undefined && actual.end < actual.start) faults.push([['actual', 'end'], 'must not be before the start'])
  if (actual.end !== undefined && actual.end > now) faults.push([['actual', 'end'], `must not be after now (${now})`])
  return faults
}
