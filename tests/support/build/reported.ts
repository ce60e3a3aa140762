import { evaluate, isRefused } from '../../../shared/evaluate.ts'
import type { Requirement } from '../../../shared/api/orders.ts'
import type { Evaluation } from '../../../shared/method/method.ts'
import { methodOf } from '../../../shared/methods.ts'
import type { Reported, ReportedTest } from '../../../shared/reports/reported.ts'
import { curveOf } from '../../standards/records/read-record.ts'

type Kind = 'rockwell' | 'tensile' | 'grain-intercept'
export type WantedReport = { count?: number; kinds?: readonly Kind[]; requirement?: 'none' | 'met' | 'broken' | 'guarded'; struck?: boolean; mixed?: boolean; remark?: string; uncertain?: boolean }

const curve = curveOf('42CrMoS4/46NT71.csv', 19.65852, 25)
const labels: Record<Kind, string> = { rockwell: 'Rockwell HRC', tensile: 'Tensile', 'grain-intercept': 'Grain size, intercept' }

/** What a run of each kind was given, a little different for every sample. */
export function inputFor(kind: Kind, at: number): { parameters: Record<string, unknown>; readings: unknown } {
  const step = (at % 7) / 10
  if (kind === 'rockwell') return { parameters: { standard: 'ASTM E18', scale: 'HRC', surface: { shape: 'flat' } }, readings: [31.2, 31.6, 31.0].map((value) => ({ value: Number((value + step).toFixed(1)) })) }
  if (kind === 'grain-intercept') return { parameters: { standard: 'ASTM E112' }, readings: [[2.512, 142], [2.512, 137], [2.512, 145], [2.512, 139], [2.512, 141]].map(([lineLengthMm, intersections]) => ({ lineLengthMm, intersections: intersections! + (at % 5) })) }
  return {
    parameters: { standard: 'ISO 6892-1', offsetPercent: 0.2, section: { shape: 'round', diametersMm: [5.003] }, originalGaugeLengthMm: 25, extensometerGaugeLengthMm: 25 },
    readings: { curve, finalGaugeLengthMm: 28.6 + step / 10, finalDiametersMm: [3.34, 3.36] },
  }
}

const limits: Record<Kind, Requirement['limits']> = {
  rockwell: [{ key: 'mean', lower: 29, upper: 34 }], tensile: [{ key: 'tensileStrength', lower: 980, upper: 1230 }, { key: 'elongation', lower: 12 }], 'grain-intercept': [{ key: 'grainSize', lower: 7 }],
}

function requirementOf(kind: Kind, wanted: NonNullable<WantedReport['requirement']>): Requirement | null {
  if (wanted === 'none') return null
  const own = wanted === 'broken' && kind === 'rockwell' ? [{ key: 'mean', lower: 31.5, upper: 34 }] : limits[kind]
  return { limits: own, rule: wanted === 'guarded' ? 'guarded' : 'simple' }
}

/** All that a report is made of, worked out by the engine from readings such as a bench gives. */
export function buildReported({ count = 2, kinds = ['rockwell'], requirement = 'none', struck = false, mixed = false, remark = '', uncertain = false }: WantedReport = {}): Reported {
  const samples = Array.from({ length: count }, (_one, at) => `J-26-00417-${String(at + 1).padStart(2, '0')}`)
  const tests = samples.flatMap((sample, at) => kinds.filter((kind) => kind !== 'grain-intercept' || count === 1 || at % 2 === 0).map((kind): ReportedTest => {
    const input = inputFor(kind, at)
    const wanted = requirementOf(kind, requirement)
    const uncertainty = uncertain && kind !== 'grain-intercept' ? { components: [{ name: 'machine', standardUncertainty: kind === 'tensile' ? 5 : 0.4 }] } : undefined
    const answer = evaluate({ method: kind, ...input, ...(wanted && { requirement: wanted }), ...(uncertainty && { uncertainty }) })
    if (isRefused(answer)) throw new Error(JSON.stringify(answer))
    const hour = 3_600_000 * (at % 9)
    return {
      sample, label: labels[kind], method: methodOf(kind)!, requirement: wanted,
      run: {
        input, evaluation: answer as Evaluation, remark: at === 0 ? remark : '', struck: struck && at === 0 ? [{ path: 'readings.3', reason: 'the indent lies too near to the edge' }] : [],
        equipment: { rockwell: 'HT-02', tensile: 'TF-01', 'grain-intercept': 'MI-02' }[kind], performedBy: 'Kit Marlow', reviewedBy: 'Ada Renn',
        startedAt: new Date(Date.UTC(2026, 2, 9, 8) + hour), recordedAt: new Date(Date.UTC(2026, 2, 11, 14) + hour), reviewedAt: new Date(Date.UTC(2026, 2, 12, 9) + hour),
      },
    }
  }))
  return {
    company: { name: 'Tarnwick Materials Testing', address: 'Foundry Lane, Tarnwick', email: 'lab@tarnwick.example' },
    site: { name: 'Tarnwick', address: 'Foundry Lane, Tarnwick', timeZone: 'Europe/London' },
    customer: { name: 'Brackwater Forge', address: 'Quay Works, Brackwater' },
    job: { number: 'J-26-00417', purchaseOrder: 'BF-88213', placedAt: new Date('2026-03-02T10:00:00Z') },
    samples: samples.map((number, at) => ({
      number, heat: ['7K4192', '7K4193', '7K4201'][Math.floor(at / 2) % 3]!, lot: `B-${204 + at}`, material: mixed && at % 3 === 2 ? 'C45 +N' : '42CrMo4 +QT', size: mixed && at % 3 === 2 ? 'bar Ø 80 mm' : 'bar Ø 60 mm',
      condition: 'undamaged and marked', receivedAt: new Date('2026-03-05T09:00:00Z'), remarks: at === 3 ? ['the stamp was confirmed by the customer on 10 Mar 2026'] : [],
    })),
    tests,
    report: { number: 'R-26-00417', revision: 1, code: 'K7Q2-94MD-XV3T', checkAddress: 'https://check.tarnwick.example/check', issuedAt: new Date('2026-03-13T15:52:00Z'), signatory: { name: 'Ada Renn', role: 'manager, authorised signatory' } },
    earlier: null,
  }
}
