import type { BenchAbility, WeekHours } from '../../../shared/planning/bench-hours.ts'
import type { SiteKey } from './demo-keys.ts'

/** The invented company of the demonstration: its sites, benches and machines. Nobody and nothing here exists. */
export const company = { name: 'Tarnwick Materials Testing', address: 'Foundry Lane, Tarnwick', email: 'lab@tarnwick.example', taxPercent: 20 }

export const sites: readonly { key: SiteKey; name: string; address: string; timeZone: string }[] = [
  { key: 'T', name: 'Tarnwick', address: 'Foundry Lane, Tarnwick', timeZone: 'Europe/London' },
  { key: 'O', name: 'Ollerby', address: 'Mill Road 4, Ollerby', timeZone: 'Europe/London' },
  { key: 'P', name: 'Port Selwyn', address: 'Dock Street 11, Port Selwyn', timeZone: 'Europe/London' },
]

const week = (from: string, to: string): WeekHours => [1, 2, 3, 4, 5].map((weekday) => ({ weekday, from, to }))
const one = (kind: string, limits: BenchAbility['limits'] = {}): BenchAbility[] => [{ kind, limits }]
const frame = (kn: number): BenchAbility[] => one('tensile', { forceKn: [0, kn], diameterMm: [2, kn > 300 ? 40 : 20], thicknessMm: [0.3, kn > 300 ? 40 : 20], widthMm: [5, 60], areaMm2: [1, kn > 300 ? 1300 : 320] })
const hardness = one('rockwell', { forceKgf: [15, 150], diameterMm: [6.4, 400] })

type Machine = { code: string; name: string; type: string; days: number; certificate: string; verified: 'passed' | 'failed' | null; text: string }
export type DemoBench = { site: SiteKey; name: string; code: string; units: number; does: BenchAbility[]; hours: WeekHours; machine?: Machine }

const tester = (code: string, days: number, text: string, verified: Machine['verified'] = 'passed'): Machine => ({ code, name: 'Hardness tester, regular Rockwell', type: 'hardness tester', days, certificate: `TC-${code}-26`, verified, text })
const tensile = (code: string, kn: number, days: number): Machine => ({ code, name: `Tensile frame ${kn} kN with extensometer, class 0.5`, type: 'tensile frame', days, certificate: `TC-${code}-26`, verified: 'passed', text: 'force and extension within class 0.5' })
const microscope = (code: string): Machine => ({ code, name: 'Light microscope with camera', type: 'microscope', days: 300, certificate: `TC-${code}-26`, verified: 'passed', text: 'stage micrometer 1 mm read as 1.000 mm' })

export const benches: readonly DemoBench[] = [
  { site: 'T', name: 'Cutting 1', code: 'T-CU1', units: 1, does: one('section'), hours: week('07:30', '17:00') },
  { site: 'T', name: 'Lathe', code: 'T-LA', units: 1, does: one('machine'), hours: week('07:30', '19:00') },
  { site: 'T', name: 'Press', code: 'T-PR', units: 2, does: one('mount'), hours: week('07:30', '17:00') },
  { site: 'T', name: 'Wheels', code: 'T-WH', units: 2, does: one('grind and polish'), hours: week('07:30', '17:00') },
  { site: 'T', name: 'Hood', code: 'T-HO', units: 2, does: one('etch'), hours: week('07:30', '17:00') },
  { site: 'T', name: 'Hardness 1', code: 'T-H1', units: 1, does: hardness, hours: week('07:30', '17:00'), machine: tester('HT-02', 114, 'block 30.4 HRC read as 30.5 HRC') },
  { site: 'T', name: 'Frame 100 kN', code: 'T-F1', units: 1, does: frame(100), hours: week('07:30', '17:00'), machine: tensile('TF-01', 100, 203) },
  { site: 'T', name: 'Frame 600 kN', code: 'T-F2', units: 1, does: frame(600), hours: week('07:30', '17:00'), machine: tensile('TF-02', 600, 77) },
  { site: 'T', name: 'Microscope', code: 'T-MI', units: 1, does: one('grain-intercept'), hours: week('07:30', '17:00'), machine: microscope('MI-02') },
  { site: 'O', name: 'Cutting', code: 'O-CU', units: 1, does: one('section'), hours: week('08:00', '16:30') },
  { site: 'O', name: 'Press', code: 'O-PR', units: 1, does: one('mount'), hours: week('08:00', '16:30') },
  { site: 'O', name: 'Wheels', code: 'O-WH', units: 1, does: one('grind and polish'), hours: week('08:00', '16:30') },
  { site: 'O', name: 'Hood', code: 'O-HO', units: 1, does: one('etch'), hours: week('08:00', '16:30') },
  { site: 'O', name: 'Hardness', code: 'O-H1', units: 1, does: hardness, hours: week('08:00', '16:30'), machine: tester('HT-11', 160, 'block 45.2 HRC read as 45.3 HRC') },
  { site: 'O', name: 'Microscope', code: 'O-MI', units: 1, does: one('grain-intercept'), hours: week('08:00', '16:30'), machine: microscope('MI-04') },
  { site: 'P', name: 'Saw', code: 'P-SA', units: 1, does: one('section'), hours: week('08:00', '17:00') },
  { site: 'P', name: 'Lathe', code: 'P-LA', units: 1, does: one('machine'), hours: week('08:00', '17:00') },
  { site: 'P', name: 'Frame 100 kN', code: 'P-F1', units: 1, does: frame(100), hours: week('08:00', '17:00'), machine: tensile('TF-21', 100, 130) },
  { site: 'P', name: 'Hardness', code: 'P-H1', units: 1, does: hardness, hours: week('08:00', '17:00'), machine: tester('HT-21', 45, 'block 62.1 HRC read as 63.4 HRC, error above 0.5 HRC', 'failed') },
]

export const offers: readonly { methodId: string; priceMinor: number; sites: readonly SiteKey[] }[] = [
  { methodId: 'rockwell', priceMinor: 1800, sites: ['T', 'O', 'P'] },
  { methodId: 'tensile', priceMinor: 8400, sites: ['T', 'P'] },
  { methodId: 'grain-intercept', priceMinor: 6200, sites: ['T', 'O'] },
]
