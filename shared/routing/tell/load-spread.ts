import type { Bookings } from '../build/bookings.ts'

/**
 * How uneven the benches' load is: the population standard deviation, over benches that are not out, of minutes held in `[now, horizon)`
 * over units x open minutes in `[now, horizon)`, to 4 decimals. A bench that is never open counts as load 0. Example: loads 0 and 0.2 give 0.1.
 */
export function loadSpread({ layout, placed }: Bookings): number {
  const { shop } = layout
  const within = (from: number, to: number) => Math.max(0, Math.min(to, shop.horizon) - Math.max(from, shop.now))
  const held = shop.benches.map(() => 0)
  for (const placement of placed) if (placement) held[placement.bench]! += within(placement.start, placement.end)
  const loads = shop.benches.flatMap(({ out, units, open }, i) => {
    const minutes = units * open.reduce((sum, [from, to]) => sum + within(from, to), 0)
    return out ? [] : [minutes > 0 ? held[i]! / minutes : 0]
  })
  if (!loads.length) return 0
  const mean = loads.reduce((sum, load) => sum + load, 0) / loads.length
  const variance = loads.reduce((sum, load) => sum + (load - mean) ** 2, 0) / loads.length
  return Math.round(Math.sqrt(variance) * 1e4) / 1e4
}
