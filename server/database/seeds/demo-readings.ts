import type { Entry } from '../../../shared/method/entries.ts'

/** Numbers that look drawn by lot and are the same every time (mulberry32). */
export function dice(seed: number): () => number {
  let state = seed >>> 0
  return () => {
    state = (state + 0x6d2b79f5) >>> 0
    let mixed = Math.imul(state ^ (state >>> 15), 1 | state)
    mixed = (mixed + Math.imul(mixed ^ (mixed >>> 7), 61 | mixed)) ^ mixed
    return ((mixed ^ (mixed >>> 14)) >>> 0) / 4294967296
  }
}

/** A deviate of the normal distribution, by the sum of twelve even ones. */
const scatter = (roll: () => number, spread: number) => (Array.from({ length: 12 }, roll).reduce((sum, one) => sum + one, 0) - 6) * spread

/** What a technician would keep for one test of the demonstration: hardness, a pull, or grain counts that fit one another. */
export function demoReadings(methodId: string, seed: number): Entry[] {
  const roll = dice(seed)
  if (methodId === 'rockwell') return hardness(roll)
  if (methodId === 'tensile') return pull(roll)
  return grain(roll)
}

function hardness(roll: () => number): Entry[] {
  const level = 31.3 + scatter(roll, 0.3)
  return Array.from({ length: 3 }, (_, at) => ({ path: `readings.${at}`, value: { value: Number((level + scatter(roll, 0.2)).toFixed(1)), xMm: 4 + at * 3, yMm: 6, edgeMm: 6 } }))
}

/** Straight, then hardening after Ludwik to a flat maximum, then necking; a toe at the start and the noise of a class 0.5 frame. */
function pull(roll: () => number): Entry[] {
  const diameter = 10 + Number(scatter(roll, 0.01).toFixed(2))
  const area = (Math.PI / 4) * diameter ** 2
  const proof = 900 + scatter(roll, 8)
  const top = proof + 108 + scatter(roll, 4)
  const modulus = 206_000
  const [agt, end] = [0.07 + scatter(roll, 0.001), 0.157 + scatter(roll, 0.002)]
  const strains = [...Array.from({ length: 260 }, (_, at) => at * 3e-5), ...Array.from({ length: 340 }, (_, at) => 0.0078 + ((end - 0.0078) * at) / 339)]
  const stress = (strain: number) => {
    const toe = 1 - Math.exp(-strain / 0.00025)
    const elastic = modulus * strain * toe
    const plastic = strain <= agt ? top - (top - proof) * ((agt - strain) / agt) ** 4 : top - (top - 0.78 * top) * ((strain - agt) / (end - agt)) ** 2
    return (elastic ** -9 + plastic ** -9) ** (-1 / 9)
  }
  const curve = {
    extensionMm: strains.map((strain) => Number((strain * 50 + scatter(roll, 0.00008)).toFixed(5))),
    forceN: strains.map((strain) => Number(((strain === 0 ? 0 : stress(strain)) * area + scatter(roll, 8)).toFixed(1))),
    timeS: strains.map((strain) => Number((strain / (strain < 0.0078 ? 0.00025 : 0.0067)).toFixed(2))),
  }
  const at = (value: number) => Number(value.toFixed(2))
  return [
    { path: 'parameters.section', value: { shape: 'round', diametersMm: [at(diameter), at(diameter), at(diameter + 0.01)] } },
    { path: 'parameters.originalGaugeLengthMm', value: 50 },
    { path: 'parameters.extensometerGaugeLengthMm', value: 50 },
    { path: 'readings.curve', value: curve },
    { path: 'readings.finalGaugeLengthMm', value: at(57.7 + scatter(roll, 0.2)) },
    { path: 'readings.finalDiametersMm', value: [at(6.42 + scatter(roll, 0.05)), at(6.44 + scatter(roll, 0.05))] },
  ]
}

function grain(roll: () => number): Entry[] {
  return Array.from({ length: 5 }, (_, at) => ({ path: `readings.${at}`, value: { lineLengthMm: 1.25, intersections: Math.round(74 + scatter(roll, 2.5)) } }))
}
