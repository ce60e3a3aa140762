import { describe, expect, it } from 'vitest'
import { buildContent } from '../../../shared/reports/build-content.ts'
import { changesBetween } from '../../../shared/reports/changes-between.ts'
import { ReportContent } from '../../../shared/reports/content.ts'
import { thinPicture } from '../../../shared/reports/thin-picture.ts'
import { buildReported } from '../../support/build/reported.ts'

const build = (wanted: Parameters<typeof buildReported>[0]) => buildContent(buildReported(wanted))
const all = { kinds: ['rockwell', 'tensile', 'grain-intercept'] as const }

describe('the results table', () => {
  it('has a column for each main result with symbol and unit, in the order of the tests', () => {
    const { columns, rows, further } = build({ ...all, count: 2 })
    expect(columns.map(({ head, unit }) => [head, unit])).toEqual([['Mean hardness', 'HRC'], ['Rp0.2', 'MPa'], ['ReH', 'MPa'], ['ReL', 'MPa'], ['Rm', 'MPa'], ['A', '%'], ['Z', '%'], ['Grain size number', 'G']])
    expect(rows.map(({ missing }) => missing)).toEqual([{}, { 't2.grainSize': 'not ordered' }])
    // published for this bar: Rm 1198.73 MPa
    expect(rows[0]?.cells['t1.tensileStrength']).toMatchObject({ reported: '1199 MPa', number: '1199' })
    expect(further.map(({ label, columns: own }) => [label, own.map(({ symbol }) => symbol)])).toEqual([
      ['Rockwell HRC', ['R', 'min', 'max', 's']], ['Tensile', expect.arrayContaining(['S0', 'mE', 'Agt', 'Ag'])], ['Grain size, intercept', ['N_L', 'l', 'CI', '%RA']],
    ])
  })

  it('puts every result of every run either there or among the further ones', () => {
    const reported = buildReported({ ...all, count: 3 })
    const { rows, further } = buildContent(reported)
    const shown = rows.reduce((sum, { cells }) => sum + Object.keys(cells).length, 0) + further.reduce((sum, table) => sum + table.rows.reduce((part, { cells }) => part + cells.filter(Boolean).length, 0), 0)
    expect(shown).toBe(reported.tests.reduce((sum, { run }) => sum + (run?.evaluation.results.length ?? 0), 0))
  })

  it('states one limit for a column where all samples have it, and else each with its samples', () => {
    const same = buildReported({ count: 3, requirement: 'met' })
    expect(buildContent(same).limits).toEqual({ 't0.mean': '29.0 to 34.0' })
    const tests = same.tests.map((test, at) => (at === 2 ? { ...test, requirement: { limits: [{ key: 'mean', lower: 31.25 }], rule: 'simple' as const } } : test))
    const { limits, conformity } = buildContent({ ...same, tests })
    expect(limits).toEqual({})
    expect(conformity?.limits).toEqual(['Rockwell HRC: 29.0 to 34.0 for samples 01 and 02; ≥ 31.25 for sample 03'])
  })

  it('states expanded uncertainties with their coverage', () => {
    const { uncertainties, coverage, statements } = build({ count: 2, uncertain: true })
    expect(uncertainties).toEqual({ 't0.mean': '0.9' })
    expect(coverage).toMatch(/^k = 2\.\d+$/)
    expect(statements.join(' ')).not.toContain('No measurement uncertainty')
    expect(build({ count: 2 })).toMatchObject({ uncertainties: {}, coverage: '', statements: expect.arrayContaining(['No measurement uncertainty is stated in this report.']) })
  })

  it('keeps two tests of one kind on a sample apart', () => {
    const reported = buildReported({ count: 1 })
    const { columns, rows } = buildContent({ ...reported, tests: [...reported.tests, ...reported.tests] })
    expect(columns.map(({ key, group }) => [key, group])).toEqual([['t0.mean', 'Rockwell HRC'], ['t1.mean', 'Rockwell HRC (2)']])
    expect(Object.keys(rows[0]!.cells)).toEqual(['t0.mean', 't1.mean'])
  })
})

describe('conformity', () => {
  it('is not spoken of without limits', () => expect(build({ count: 1 }).conformity).toBeNull())

  it('carries its decision rule, guarded or simple', () => {
    expect(build({ count: 1, requirement: 'met' }).conformity).toMatchObject({ outcome: 'pass', statement: 'Every limit that was ordered is met.', rule: expect.stringContaining('simple acceptance'), findings: [] })
    const guarded = build({ count: 1, requirement: 'guarded', uncertain: true }).conformity
    expect(guarded).toMatchObject({ outcome: 'pass', rule: expect.stringContaining('guard band equal to the expanded uncertainty') })
  })

  it('is undecided by the guarded rule where no uncertainty is stated', () => {
    const { conformity, rows } = build({ count: 1, requirement: 'guarded' })
    expect(conformity).toMatchObject({ outcome: 'undecided', statement: 'Every limit is met or undecided; none is broken.', findings: ['Sample 01, Rockwell HRC: 31.3 HRC is undecided, since its uncertainty is not stated; at least 29 and at most 34 was asked for.'] })
    expect(rows[0]?.outcome).toBe('undecided')
  })

  it('names a result that was limited but not found', () => {
    const reported = buildReported({ count: 1, requirement: 'met' })
    const tests = reported.tests.map((test) => ({ ...test, requirement: { limits: [{ key: 'standardDeviation', upper: 1 }], rule: 'simple' as const }, run: { ...test.run!, evaluation: { ...test.run!.evaluation, results: test.run!.evaluation.results.slice(0, 1), verdict: { outcome: 'undecided' as const, rule: 'simple' as const, limits: [{ key: 'standardDeviation', upper: 1, outcome: 'undecided' as const }] } } } }))
    const { conformity, rows } = buildContent({ ...reported, tests })
    expect(conformity?.findings).toEqual(['Sample 01, Rockwell HRC, s: no result, undecided; at most 1 was asked for.'])
    expect(Object.values(rows[0]!.missing)).toEqual(['no result'])
  })
})

describe('a report', () => {
  it('keeps its shape through the database', () => {
    const content = build({ ...all, count: 2, requirement: 'broken', struck: true, mixed: true, remark: 'slow' })
    expect(ReportContent.parse(JSON.parse(JSON.stringify(content)))).toEqual(content)
  })

  it('says warnings and remarks as deviations, and what was struck out beside the readings', () => {
    const reported = buildReported({ count: 2, remark: 'went on as agreed', struck: true })
    const tests = reported.tests.map((test, at) => (at === 0 ? { ...test, run: { ...test.run!, evaluation: { ...test.run!.evaluation, checks: [{ code: 'spacing', severity: 'warning' as const, message: 'too near to reading 1', reading: 1 }, { code: 'note', severity: 'info' as const, message: 'fine' }] } } } : test))
    const { deviations, readings } = buildContent({ ...reported, tests })
    expect(deviations).toEqual(['Sample 01, Rockwell HRC: reading 2: too near to reading 1. remark: went on as agreed.'])
    expect(readings[0]).toMatchObject({ columns: ['Reading, HR'], rows: [['31.2'], ['31.6'], ['31.0']], notes: ['Reading 4 struck out: the indent lies too near to the edge'] })
  })

  it('tells a long record by its length and writes other readings out', () => {
    const { readings } = build({ count: 1, kinds: ['tensile'] })
    expect(readings[0]?.rows).toEqual([[expect.stringMatching(/^record of \d+ points$/), '28.60', '3.34, 3.36']])
  })

  it('is refused without a single accepted run', () => {
    const reported = buildReported({ count: 1 })
    expect(() => buildContent({ ...reported, tests: reported.tests.map((test) => ({ ...test, run: null })) })).toThrow(RangeError)
  })

  it('says what it changes in the one before, and nothing when nothing changed but the order of keys', () => {
    const reported = buildReported({ count: 2 })
    const earlier = buildContent(reported)
    const turned = Object.fromEntries(Object.entries(earlier).reverse()) as ReportContent
    expect(changesBetween(turned, earlier)).toEqual([])
    const samples = reported.samples.map((sample, at) => (at === 1 ? { ...sample, heat: '7K9999' } : sample))
    expect(buildContent({ ...reported, samples, report: { ...reported.report, revision: 2 }, earlier }).supersedes).toEqual({ number: 'R-26-00417/1', changes: ['heat of sample J-26-00417-02: 7K9999, was 7K4192'] })
  })
})

it('thins a curve without losing its peak or its ends', () => {
  const points = Array.from({ length: 20_000 }, (_one, at): [number, number] => [at, at === 12_345 ? 500 : at % 7])
  const axis = { label: 'x', unit: '' }
  const { lines } = thinPicture({ title: 'x', x: axis, y: axis, lines: [{ kind: 'curve', points }], marks: [] })
  expect(lines[0]!.points.length).toBeLessThanOrEqual(402)
  expect(lines[0]!.points).toContainEqual([12_345, 500])
  expect([lines[0]!.points[0], lines[0]!.points.at(-1)]).toEqual([points[0], points.at(-1)])
  const xs = lines[0]!.points.map(([x]) => x)
  expect([...xs].sort((a, b) => a - b)).toEqual(xs)
})
