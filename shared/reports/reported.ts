import type { Requirement } from '../api/orders.ts'
import type { Evaluation, Method } from '../method/method.ts'
import type { ReportContent } from './content.ts'

/** An accepted run as a report tells of it. `input` is the engine's: what was ordered and every reading that counts. */
export type ReportedRun = {
  input: { parameters: Record<string, unknown>; readings: unknown }
  evaluation: Evaluation
  remark: string
  struck: readonly { path: string; reason: string }[]
  equipment: string | null
  performedBy: string
  reviewedBy: string
  startedAt: Date
  recordedAt: Date
  reviewedAt: Date
}

/** A test of a sample; without a run when it was called off. */
export type ReportedTest = { sample: string; label: string; method: Method; requirement: Requirement | null; run: ReportedRun | null }

/** All that a report is made of, as loaded. Tests stand in the order of samples and positions. */
export type Reported = {
  company: ReportContent['company']
  site: ReportContent['site']
  customer: ReportContent['customer']
  job: { number: string; purchaseOrder: string; placedAt: Date }
  samples: readonly { number: string; heat: string; lot: string; material: string; size: string; condition: string; receivedAt: Date | null; remarks: readonly string[] }[]
  tests: readonly ReportedTest[]
  report: { number: string; revision: number; code: string; checkAddress: string; issuedAt: Date; signatory: ReportContent['signatory'] }
  /** The revision that this one replaces. */
  earlier: ReportContent | null
}
