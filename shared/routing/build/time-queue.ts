/** Numbers waiting for their time: a binary heap by time, then by number, so that equal times keep one order. */
export class TimeQueue {
  private readonly heap: { time: number; item: number }[] = []

  get first(): number {
    return this.heap[0]?.time ?? Infinity
  }

  push(time: number, item: number): void {
    const { heap } = this
    heap.push({ time, item })
    for (let i = heap.length - 1; i > 0; ) {
      const parent = (i - 1) >> 1
      if (!this.swapIfBefore(i, parent)) return
      i = parent
    }
  }

  pop(): number | undefined {
    const { heap } = this
    const top = heap[0]
    const last = heap.pop()
    if (heap.length && last) {
      heap[0] = last
      for (let i = 0; ; ) {
        let child = 2 * i + 1
        if (child >= heap.length) break
        if (child + 1 < heap.length && this.isBefore(child + 1, child)) child++
        if (!this.swapIfBefore(child, i)) break
        i = child
      }
    }
    return top?.item
  }

  private isBefore(a: number, b: number): boolean {
    const [x, y] = [this.heap[a]!, this.heap[b]!]
    return x.time < y.time || (x.time === y.time && x.item < y.item)
  }

  private swapIfBefore(a: number, b: number): boolean {
    if (!this.isBefore(a, b)) return false
    const kept = this.heap[a]!
    this.heap[a] = this.heap[b]!
    this.heap[b] = kept
    return true
  }
}
