import { changesBetween } from './changes-between.ts'
import { conformityStatement } from './conformity-statement.ts'
import type { ReportContent } from './content.ts'
import { deviations } from './deviations.ts'
import { furtherResults } from './further-results.ts'
import { methodsUsed } from './methods-used.ts'
import { readingsAnnex } from './readings-annex.ts'
import type { Reported, ReportedRun } from './reported.ts'
import { resultColumns, resultsTable } from './results-table.ts'
import { testColumns } from './test-columns.ts'
import { thinPicture } from './thin-picture.ts'

/** Puts together all that a report says. Throws RangeError without a single accepted run. */
export function buildContent(reported: Reported): ReportContent {
  const { company, site, customer, job, samples, tests, report, earlier } = reported
  const runs = tests.flatMap(({ run }) => run ?? [])
  if (runs.length === 0) throw new RangeError('a report needs at least one accepted run')
  const ways = testColumns(tests)
  const columns = resultColumns(ways)
  const methods = methodsUsed(ways)
  const differing = new Set(methods.filter(({ lines }) => lines.some((line) => line.startsWith('What differs'))).map(({ label }) => label))
  const received = samples.flatMap(({ receivedAt }) => receivedAt ?? [])
  const table = resultsTable(columns, samples.map(({ number }) => number))
  const content: ReportContent = {
    title: 'Test report', company, site, number: report.number, revision: report.revision, code: report.code, checkAddress: report.checkAddress, supersedes: null,
    customer, purchaseOrder: job.purchaseOrder, jobNumber: job.number,
    dates: {
      placed: job.placedAt.toISOString(), received: received.length > 0 ? stretch(received) : null, issued: report.issuedAt.toISOString(),
      tested: stretch(runs.flatMap(({ startedAt, recordedAt }) => [startedAt, recordedAt])), reviewed: stretch(runs.map(({ reviewedAt }) => reviewedAt)),
    },
    samples: samples.map(({ receivedAt, remarks, ...sample }) => ({ ...sample, receivedAt: receivedAt?.toISOString() ?? null, remarks: [...remarks] })),
    methods, ...table, further: furtherResults(ways, columns), conformity: conformityStatement(tests, columns), readings: readingsAnnex(tests, differing),
    conversions: tests.flatMap(({ sample, label, method, run }) =>
      (run ? (method.conversions?.({ parameters: run.input.parameters, results: run.evaluation.results }) ?? []) : []).map((conversion) => ({ sample, of: mainOf(label, method.mainResult, run), ...conversion }))),
    pictures: tests.flatMap(({ sample, method, run }) => (run ? (method.pictures?.(run.input) ?? []) : []).map((picture) => ({ sample, picture: thinPicture(picture) }))),
    deviations: deviations(tests), statements: statements(table.coverage !== ''), signatory: report.signatory,
    reviewers: names(runs.map(({ reviewedBy }) => reviewedBy)), testers: names(runs.map(({ performedBy }) => performedBy)),
  }
  return earlier ? { ...content, supersedes: { number: `${earlier.number}/${earlier.revision}`, changes: changesBetween(earlier, content) } } : content
}

/** What has to be said whatever was tested (ISO/IEC 17025:2017, 7.8.2.1 k, l, p, and 7.8.2.2). */
function statements(hasUncertainty: boolean): string[] {
  return [
    'The results relate only to the items tested. The customer took the samples: the results apply to them as received, and material, size, heat and lot are as stated by the customer.',
    ...(hasUncertainty ? [] : ['No measurement uncertainty is stated in this report.']),
    'All tests were done by the laboratory itself at the place named above; nothing was subcontracted. No opinions or interpretations are expressed. This report shall not be reproduced except in full without the written approval of the laboratory.',
  ]
}

function mainOf(label: string, key: string, run: ReportedRun | null): string {
  return run?.evaluation.results.find((result) => result.key === key)?.reported ?? label
}

function stretch(times: readonly Date[]): { from: string; to: string } {
  const sorted = times.map((time) => time.getTime()).sort((a, b) => a - b)
  return { from: new Date(sorted[0]!).toISOString(), to: new Date(sorted.at(-1)!).toISOString() }
}

const names = (all: readonly string[]) => [...new Set(all)].sort()
