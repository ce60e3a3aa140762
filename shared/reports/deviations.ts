import type { ReportedTest } from './reported.ts'

/** What departed from the method: rules that were broken with a remark to go on, and remarks of the people at the bench (ISO/IEC 17025:2017, 7.8.2.1 n). */
export function deviations(tests: readonly ReportedTest[]): string[] {
  return tests.flatMap(({ sample, label, run }) => {
    if (!run) return [`Sample ${short(sample)}, ${label}: ordered, but not tested.`]
    const warnings = run.evaluation.checks.filter(({ severity }) => severity === 'warning').map(({ message, reading }) => `${reading === undefined ? '' : `reading ${reading + 1}: `}${message}`)
    if (warnings.length === 0 && run.remark === '') return []
    return [`Sample ${short(sample)}, ${label}: ${[...warnings, ...(run.remark ? [`remark: ${run.remark}`] : [])].map(ended).join(' ')}`]
  })
}

const short = (number: string) => number.split('-').at(-1) ?? number
const ended = (text: string) => (/[.!?]$/.test(text) ? text : `${text}.`)
