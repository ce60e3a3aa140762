import type { Bar } from '../layout/barred-from.ts'
import type { Layout } from '../layout/layout.ts'
import { barSentence } from './bar-sentence.ts'
import { benchBars } from './bench-bars.ts'

/** The rules in the order in which they are tried: a bench that fails a later one came nearer. */
const nearness: Bar['rule'][] = ['kind', 'limit', 'scope', 'pinned-bench', 'out', 'usable-until', 'nobody', 'authorised-until']

/** Why no bench can do a step at any time, told by the benches that came nearest, and what would help. */
export function whyBarred(layout: Layout, i: number): [because: string, cures: string[]] {
  const { shop, steps } = layout
  const { step } = steps[i]!
  const pinned = step.pin?.bench
  const bars = benchBars(layout, i)
  if (pinned !== undefined) {
    const mine = bars.find(({ bench }) => shop.benches[bench]!.id === pinned)
    const bench = shop.benches.find(({ id }) => id === pinned)
    const why = mine && bench ? barSentence(mine.bar, step, bench) : `does not do ${step.kind}`
    return [`pinned to ${pinned}, but: ${why}`, ['Remove the pinned bench', ...(mine ? [cure(layout, i, mine.bench, mine.bar)] : [])]]
  }
  if (!bars.length) return [`no bench does ${step.kind}`, [`Add a bench that does ${step.kind}`]]
  const furthest = Math.max(...bars.map(({ bar }) => nearness.indexOf(bar.rule)))
  const nearest = bars.filter(({ bar }) => nearness.indexOf(bar.rule) === furthest)
  const first = nearest[0]!.bar
  const list = nearest.map(({ bench, bar }) => `${shop.benches[bench]!.id}: ${barSentence(bar, step, shop.benches[bench]!)}`).join('; ')
  const head = first.rule === 'limit' ? `no bench takes ${first.need} ${first.value}` : `no bench can do this ${step.kind} step`
  return [`${head} (${list})`, [...new Set(nearest.map(({ bench, bar }) => cure(layout, i, bench, bar)))].slice(0, 5)]
}

function cure({ shop, steps }: Layout, i: number, at: number, bar: Bar): string {
  const bench = shop.benches[at]!
  const { step } = steps[i]!
  switch (bar.rule) {
    case 'kind': return `Add a bench that does ${step.kind}`
    case 'limit': return `Add a bench that takes ${bar.need} ${bar.value}`
    case 'scope': return `Take ${bar.scope} into the scope of site ${bench.site}, or order the test without accreditation`
    case 'pinned-bench': return 'Remove the pinned bench'
    case 'out': return `Bring ${bench.id} back into use`
    case 'usable-until': return `Calibrate ${bench.id}`
    case 'nobody': return bar.person === null ? `Authorise somebody at site ${bench.site} for ${step.kind}` : 'Remove the pinned person'
    case 'authorised-until': return `Renew the authorisation for ${step.kind} at site ${bench.site}`
  }
}
