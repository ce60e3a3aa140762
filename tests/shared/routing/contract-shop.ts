import type { Shop } from '../../../shared/routing/shop.ts'

const open: [number, number][] = [[480, 1020], [1920, 2460]]

/** The example of the planning contract, with a second frame at the other site. Each call gives a fresh copy. */
export function contractShop(): Shop {
  return structuredClone<Shop>({
    now: 480, frozenMinutes: 240, horizon: 20160, effort: 20000,
    sites: [
      { id: 'T', scope: ['rockwell', 'tensile'], courier: [{ to: 'O', departures: [960, 2400], minutes: 120 }] },
      { id: 'O', scope: ['rockwell'], courier: [{ to: 'T', departures: [900, 2340], minutes: 120 }] },
    ],
    benches: [
      { id: 'T-lathe', site: 'T', units: 1, open, does: [{ kind: 'machine', limits: {} }], usableUntil: 90000, out: false },
      { id: 'T-frame-1', site: 'T', units: 1, open, does: [{ kind: 'pull', limits: { forceKn: [0, 100], diameterMm: [2, 20] } }], usableUntil: 9000, out: false },
      { id: 'O-frame-1', site: 'O', units: 1, open, does: [{ kind: 'pull', limits: { forceKn: [0, 600], diameterMm: [2, 30] } }], usableUntil: 9000, out: false },
    ],
    people: [
      { id: 'p1', site: 'T', open, may: [{ kind: 'machine', until: 90000 }, { kind: 'pull', until: 9000 }] },
      { id: 'p2', site: 'O', open, may: [{ kind: 'pull', until: 9000 }] },
    ],
    jobs: [{ id: 'J1', due: 2880, weight: 2 }],
    samples: [{ id: 'S1', job: 'J1', site: 'T', availableFrom: 480 }],
    steps: [
      { id: 'a', sample: 'S1', kind: 'machine', after: [], setupMinutes: 10, runMinutes: 40, attended: 'all', needs: {}, scope: null },
      {
        id: 'b', sample: 'S1', kind: 'pull', after: ['a'], setupMinutes: 5, runMinutes: 15, attended: 'all', needs: { forceKn: 83, diameterMm: 10 }, scope: 'tensile',
        pin: { bench: 'T-frame-1' }, previous: { bench: 'T-frame-1', person: 'p1', start: 600 },
      },
    ],
  })
}
