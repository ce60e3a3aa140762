import type { Reading, TestRun } from '../../../shared/api/test-runs.ts'

/** An open run with these readings, as the server gives it. */
export function aRun(wanted: Partial<TestRun> = {}): TestRun {
  const id = '01a23210-0000-7000-8000-000000000001'
  return {
    id, testId: id, sampleId: id, jobId: id, number: 1, state: 'open', version: 1, methodId: 'rockwell', methodVersion: 1, siteId: id, siteName: 'Tarnwick', timeZone: 'Europe/London', benchId: id, benchName: 'Hardness 1', equipment: null,
    performedById: id, performedBy: 'Edda Vane', startedAt: '2026-03-10T10:00:00.000Z', recordedAt: null, sampleNumber: 'J-26-00417-03', heat: '7K4193', lot: 'B-206', material: '42CrMo4 +QT', piece: { form: 'bar', diameterMm: 60 },
    purchaseOrder: '', customerName: 'Brackwater Forge', neededBy: null, traveller: [], parameters: { standard: 'ASTM E18', scale: 'HRC', surface: { shape: 'flat' } }, requirement: null, readings: [], evaluation: null, remark: '', reviews: [],
    notMineToReview: '', mayReviewUntil: null, authorisedUntil: '2027-01-01', sameSample: [], ...wanted,
  }
}

export function aReading(wanted: Partial<Reading> & Pick<Reading, 'key' | 'path' | 'value'>): Reading {
  return { id: '01a23210-0000-7000-8000-000000000002', at: '2026-03-10T10:01:00.000Z', by: 'Edda Vane', struck: null, ...wanted }
}
