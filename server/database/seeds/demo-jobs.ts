import { afterwardsChoices, type Order } from '../../../shared/api/orders.ts'
import { methodOf } from '../../../shared/methods.ts'
import type { Piece } from '../../../shared/method/piece.ts'
import type { CustomerKey, SiteKey } from './demo-keys.ts'

/** How far the demonstration takes a job. */
export type Reach = 'draft' | 'awaiting samples' | 'received' | 'half measured' | 'in review' | 'accepted' | 'reported'

export type DemoJob = { customer: CustomerKey; site: SiteKey; reach: Reach; order: Order; hold?: { row: number; reason: string; question: string; answers: string[] } }

type Row = { heat: string; lot: string; tests?: string[] }
const bar60: Piece = { form: 'bar', diameterMm: 60 }

const columnsFor = (piece: Piece, limits: boolean): Order['columns'] => [
  { key: 'h', methodId: 'rockwell', parameters: methodOf('rockwell')!.suggest(piece), requirement: limits ? { limits: [{ key: 'mean', lower: 29, upper: 34 }], rule: 'simple' } : null },
  { key: 't', methodId: 'tensile', parameters: methodOf('tensile')!.suggest(piece), requirement: limits ? { limits: [{ key: 'proofStrength', lower: 850 }, { key: 'tensileStrength', lower: 980, upper: 1130 }], rule: 'simple' } : null },
  { key: 'g', methodId: 'grain-intercept', parameters: methodOf('grain-intercept')!.suggest(piece), requirement: limits ? { limits: [{ key: 'grainSize', lower: 7 }], rule: 'simple' } : null },
]

function order(purchaseOrder: string, material: string, rows: readonly Row[], keys: readonly string[], { piece = bar60, limits = false, afterwards = 0 } = {}): Order {
  return {
    purchaseOrder, neededBy: null, afterwards: afterwardsChoices[afterwards]!, siteId: null,
    columns: columnsFor(piece, limits).filter(({ key }) => keys.includes(key)),
    samples: rows.map(({ heat, lot, tests = [...keys] }) => ({ heat, lot, material, piece, tests, overrides: {} })),
  }
}

const row = (heat: string, lot: string, ...tests: string[]): Row => ({ heat, lot, ...(tests.length > 0 && { tests }) })
const rows = (heat: string, from: number, count: number) => Array.from({ length: count }, (_, at) => row(heat, `L-${from + at}`))

/** The demonstration's work, oldest first. Heats, lots and order numbers are invented. */
export const demoJobs: readonly DemoJob[] = [
  { customer: 'brackwater', site: 'T', reach: 'reported', order: order('BF-88187', '42CrMo4 +QT', [row('7K4101', 'B-181'), row('7K4101', 'B-182')], ['h', 't', 'g'], { limits: true }) },
  { customer: 'lindmoor', site: 'O', reach: 'accepted', order: order('LC-2041', 'C45 +N', rows('5M2210', 31, 3), ['h', 'g']) },
  { customer: 'oriel', site: 'T', reach: 'in review', order: order('OG-771', '34CrNiMo6 +QT', rows('9R0152', 12, 2), ['h', 't']) },
  {
    customer: 'brackwater', site: 'T', reach: 'half measured',
    order: order('BF-88213', '42CrMo4 +QT', [row('7K4192', 'B-204'), row('7K4192', 'B-205', 'h', 't'), row('7K4193', 'B-206'), row('7K4193', 'B-207', 'h', 't'), row('7K4201', 'B-210'), row('7K4201', 'B-211', 'h', 't')], ['h', 't', 'g'], { limits: true }),
    hold: { row: 3, reason: 'The bar is stamped 7K4139, the order says 7K4193.', question: 'Which is right?', answers: ['The stamp was misread, 7K4193 is right', 'Take 7K4139', 'Return the sample'] },
  },
  { customer: 'oriel', site: 'P', reach: 'received', order: order('OG-779', 'S355J2', rows('2T6630', 71, 4), ['t'], { piece: { form: 'plate', thicknessMm: 20, widthMm: 120 } }) },
  { customer: 'lindmoor', site: 'O', reach: 'awaiting samples', order: order('LC-2047', 'C45 +N', rows('5M2218', 51, 5), ['h', 'g']) },
  { customer: 'brackwater', site: 'T', reach: 'awaiting samples', order: order('BF-88236', '34CrNiMo6 +QT', rows('7K4230', 240, 6), ['h', 't'], { piece: { form: 'bar', diameterMm: 45 }, limits: true }) },
  { customer: 'brackwater', site: 'T', reach: 'draft', order: order('BF-88243', '25CrMo4 +QT', rows('D22071', 31, 3), ['h', 't']) },
]
