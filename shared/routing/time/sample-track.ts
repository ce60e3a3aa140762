import type { Couriers } from './couriers.ts'

export type Stay = { step: number; site: number; start: number; end: number }

/** Where one sample is and when: its stays on benches in order of time, from where it lies at first. */
export class SampleTrack {
  readonly stays: Stay[] = []
  private readonly origin: { site: number; at: number }
  private readonly couriers: Couriers

  constructor(couriers: Couriers, site: number, at: number) {
    this.couriers = couriers
    this.origin = { site, at }
  }

  add(stay: Stay): void {
    let i = this.after(stay.start)
    // A stay of no length goes before a longer one that begins at the same minute.
    while (i < this.stays.length && this.stays[i]!.start === stay.start && this.stays[i]!.end <= stay.end) i++
    this.stays.splice(i, 0, stay)
  }

  remove(step: number): void {
    const i = this.stays.findIndex((stay) => stay.step === step)
    if (i >= 0) this.stays.splice(i, 1)
  }

  /** Where the sample comes from for what follows the first `count` stays. */
  before(count: number): { site: number; at: number } {
    const stay = this.stays[count - 1]
    // A started step may end before the sample is said to be available.
    return stay ? { site: stay.site, at: Math.max(stay.end, this.origin.at) } : this.origin
  }

  /** The same sample as if nothing of it at or after `time` were planned. */
  upTo(time: number): SampleTrack {
    const track = new SampleTrack(this.couriers, this.origin.site, this.origin.at)
    track.stays.push(...this.stays.slice(0, this.after(time)))
    return track
  }

  /** The first start at or after `from` at which the sample can be at `site` for `length` minutes and still reach what follows. */
  firstFree(site: number, from: number, length: number): number {
    for (let i = this.after(from); ; i++) {
      const { site: last, at } = this.before(i)
      const start = Math.max(from, this.couriers.arrival(last, site, at))
      const next = this.stays[i]
      if (!next) return start
      if (start + length <= next.start && this.couriers.arrival(site, next.site, start + length) <= next.start) return start
    }
  }

  /** How many stays begin before `time`. */
  private after(time: number): number {
    let i = this.stays.length
    while (i > 0 && this.stays[i - 1]!.start >= time) i--
    return i
  }
}
