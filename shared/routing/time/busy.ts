/**
 * How many units of a bench (or of a person: one) are held at every minute, as a sorted list of the times at which the number
 * changes. Neighbours with equal numbers are merged, so that a bench without gaps is one stretch, however many steps it holds.
 */
export class Busy {
  private readonly times: number[] = [-Infinity]
  private readonly held: number[] = [0]

  add(from: number, to: number): void {
    this.change(from, to, 1)
  }

  remove(from: number, to: number): void {
    this.change(from, to, -1)
  }

  /** The first start at or after `from` with a unit free for `length` minutes. */
  firstFree(from: number, length: number, units: number): number {
    let start = from
    let i = this.at(from)
    for (;;) {
      while (this.held[i]! >= units) start = this.times[++i]!
      let j = i + 1
      while (j < this.times.length && this.times[j]! < start + length && this.held[j]! < units) j++
      if (j >= this.times.length || this.times[j]! >= start + length) return start
      i = j
    }
  }

  private at(time: number): number {
    let [low, high] = [0, this.times.length - 1]
    while (low < high) {
      const middle = (low + high + 1) >> 1
      if (this.times[middle]! <= time) low = middle
      else high = middle - 1
    }
    return low
  }

  private split(time: number): number {
    const i = this.at(time)
    if (this.times[i] === time) return i
    this.times.splice(i + 1, 0, time)
    this.held.splice(i + 1, 0, this.held[i]!)
    return i + 1
  }

  private change(from: number, to: number, by: number): void {
    const last = this.split(to)
    const first = this.split(from)
    const end = this.times[last] === to ? last : last + 1
    for (let i = first; i < end; i++) this.held[i]! += by
    this.merge(end)
    this.merge(first)
  }

  private merge(i: number): void {
    if (i === 0 || this.held[i] !== this.held[i - 1]) return
    this.times.splice(i, 1)
    this.held.splice(i, 1)
  }
}
