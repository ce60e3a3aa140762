import { describe, expect, it } from 'vitest'
import type { TestRun } from '../../../shared/api/test-runs.ts'
import { evaluate } from '../../../shared/evaluate.ts'
import type { Evaluation } from '../../../shared/method/method.ts'
import { lookOver } from '../../../src/components/review/look-over.ts'
import { aReading, aRun } from '../bench/a-run.ts'

const parameters = { standard: 'ASTM E18', scale: 'HRC', surface: { shape: 'flat' } }
const values = [31.2, 31.6, 31.4]
const evaluation = evaluate({ method: 'rockwell', parameters, readings: values.map((value) => ({ value })) }) as Evaluation
const recorded = (wanted: Partial<TestRun> = {}) => aRun({
  state: 'recorded', parameters, evaluation, readings: values.map((value, row) => aReading({ id: `01a23210-0000-7000-8000-00000000001${row}`, key: `reading-${row}`, path: `readings.${row}`, value: { value } })),
  equipment: { id: '01a23210-0000-7000-8000-000000000001', code: 'HT-02', name: 'Hardness tester', kind: 'hardness tester', siteId: '01a23210-0000-7000-8000-000000000001', siteName: 'Tarnwick', calibratedUntil: '2026-12-31', certificate: 'C-1', outOfUse: false, lastVerification: { at: '2026-03-10T07:50:00.000Z', passed: true, text: '' } },
  ...wanted,
})
const titles = (run: TestRun) => lookOver(run).unusual.map(({ title }) => title)

describe('looking a run over', () => {
  it('finds an ordinary run in order, worked out a second time', () => {
    const { unusual, inOrder } = lookOver(recorded())
    expect(unusual).toEqual([])
    expect(inOrder).toContain('Worked out again here, same results')
  })

  it('stops at a result that the readings do not give', () => {
    const wrong = { ...evaluation, results: evaluation.results.map((result) => (result.key === evaluation.results[0]?.key ? { ...result, reported: '99.9 HRC' } : result)) }
    expect(titles(recorded({ evaluation: wrong }))).toEqual(['Worked out again here, some results differ.'])
  })

  it('stops at what was struck out, with the reason, and leaves it out of the second calculation', () => {
    const run = recorded()
    const struck = aReading({ id: '01a23210-0000-7000-8000-000000000019', key: 'reading-9', path: 'readings.3', value: { value: 12 }, struck: { reason: 'anvil was dirty', at: '2026-03-10T10:02:00.000Z', by: 'Edda Vane' } })
    const { unusual } = lookOver({ ...run, readings: [...run.readings, struck] })
    expect(unusual).toHaveLength(1)
    expect(unusual[0]?.list?.[0]).toContain('Anvil was dirty.')
  })

  it('puts what speaks against the run first: calibration over on the day, verification failed, authorisation ended', () => {
    const { equipment } = recorded()
    const run = recorded({ authorisedUntil: null, remark: 'Second anvil.', equipment: equipment && { ...equipment, calibratedUntil: '2026-03-09', lastVerification: { at: '2026-03-10T07:50:00.000Z', passed: false, text: 'read 1.3 HRC high' } } })
    expect(lookOver(run).unusual.map(({ kind }) => kind)).toEqual(['bad', 'bad', 'bad', 'plain'])
    expect(titles(run)[0]).toBe('The calibration of HT-02 had ended.')
  })

  it('takes a calibration that ends on the day of the run as good', () => {
    const { equipment } = recorded()
    expect(titles(recorded({ equipment: equipment && { ...equipment, calibratedUntil: '2026-03-10' } }))).toEqual([])
  })
})
