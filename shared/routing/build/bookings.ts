import type { Layout, Placement } from '../layout/layout.ts'
import { Busy } from '../time/busy.ts'
import { SampleTrack } from '../time/sample-track.ts'

/** A plan in the making: what is placed, and what benches, people and samples are held by it. */
export class Bookings {
  readonly layout: Layout
  readonly placed: (Placement | null)[]
  readonly benches: Busy[]
  readonly people: Busy[]
  readonly tracks: SampleTrack[]

  /** Started steps hold their bench, person and sample from the beginning; done ones hold nothing any more. */
  constructor(layout: Layout) {
    const { shop, couriers, sampleSites } = layout
    this.layout = layout
    this.placed = layout.steps.map(({ fixed }) => fixed)
    this.benches = shop.benches.map(() => new Busy())
    this.people = shop.people.map(() => new Busy())
    this.tracks = shop.samples.map(({ availableFrom }, i) => new SampleTrack(couriers, sampleSites[i]!, Math.max(shop.now, availableFrom)))
    layout.steps.forEach(({ fixed, step }, i) => fixed && step.state === 'started' && this.hold(i, fixed))
  }

  place(step: number, placement: Placement): void {
    this.placed[step] = placement
    this.hold(step, placement)
  }

  remove(step: number): Placement | null {
    const placement = this.placed[step] ?? null
    if (!placement) return null
    const { attendedLength, sample } = this.layout.steps[step]!
    this.placed[step] = null
    this.benches[placement.bench]!.remove(placement.start, bookedUntil(placement))
    if (placement.person !== null) this.people[placement.person]!.remove(placement.start, placement.start + Math.max(1, attendedLength))
    this.tracks[sample]!.remove(step)
    return placement
  }

  /** The earliest start that what the step waits for allows; Infinity while some of that is not placed. */
  ready(step: number): number {
    const { earliest, before } = this.layout.steps[step]!
    return before.reduce((time, each) => Math.max(time, this.placed[each]?.end ?? Infinity), earliest)
  }

  private hold(step: number, placement: Placement): void {
    const { bench, person, start, end } = placement
    const { attendedLength, sample } = this.layout.steps[step]!
    this.benches[bench]!.add(start, bookedUntil(placement))
    if (person !== null) this.people[person]!.add(start, start + Math.max(1, attendedLength))
    this.tracks[sample]!.add({ step, site: this.layout.benchSites[bench]!, start, end })
  }
}

/** A step without length still holds a minute of its bench, so that nothing runs across it. */
const bookedUntil = ({ start, end }: Placement) => Math.max(end, start + 1)
