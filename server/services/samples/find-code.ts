import { Op, type WhereOptions } from 'sequelize'
import { Problem } from '../../../shared/problems.ts'
import type { Caller } from '../../caller.ts'
import { accessibleWhere } from '../../models/accessible.ts'
import { Job } from '../../models/jobs/job.ts'
import { Sample } from '../../models/jobs/sample.ts'
import { Report } from '../../models/reports/report.ts'

type Found = { subject: 'Sample' | 'Job' | 'Report'; id: string; number: string }

/** What a scanned code or a typed number stands for, among what the caller may see. */
export async function findCode(typed: string, caller: Caller): Promise<Found> {
  const code = typed.toUpperCase()
  const found = (await look(Sample, 'Sample', { [Op.or]: [{ code }, { number: code }] }, caller)) ?? (await look(Job, 'Job', { number: code }, caller))
    ?? (await look(Report, 'Report', { number: code.replace(/\/\d+$/, '') }, caller))
  if (!found) throw new Problem('not-found', `nothing here is called ${typed}`)
  return found
}

async function look(table: typeof Sample | typeof Job | typeof Report, subject: Found['subject'], where: WhereOptions, caller: Caller): Promise<Found | null> {
  const allowed = accessibleWhere(caller.ability, 'read', subject)
  if (!allowed) return null
  // the three tables share these two columns; the compiler cannot call a method of a union of models
  const row = await (table as typeof Sample).findOne({ where: { [Op.and]: [where, allowed] }, attributes: ['id', 'number'], order: [['id', 'DESC']], raw: true })
  return row && { subject, id: row.id, number: row.number }
}
