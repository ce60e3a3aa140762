import type { Report } from '../../models/reports/report.ts'

/** The name under which a report is saved: "R-26-00417-1.pdf". */
export function reportFileName({ number, revision }: Pick<Report, 'number' | 'revision'>): string {
  return `${number}-${revision}.pdf`
}
