import type { Bookings } from '../build/bookings.ts'
import type { Transfer } from '../plan.ts'

/** The courier legs that the placed steps need: of each way the one with the fewest legs that is there in time. */
export function transfersOf({ layout, tracks }: Bookings): Transfer[] {
  const { shop, couriers, steps } = layout
  const transfers: Transfer[] = []
  tracks.forEach((track, sample) => {
    track.stays.forEach((stay, i) => {
      // A started step has its sample; how it came there is past.
      if (steps[stay.step]!.fixed) return
      const { site, at } = track.before(i)
      for (const leg of couriers.way(site, stay.site, at, stay.start) ?? []) {
        transfers.push({
          sample: shop.samples[sample]!.id,
          from: shop.sites[leg.from]!.id, to: shop.sites[leg.to]!.id,
          depart: leg.depart, arrive: leg.arrive,
        })
      }
    })
  })
  return transfers
}
