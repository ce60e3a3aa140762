import { literal, Op, type WhereOptions } from 'sequelize'
import type * as z from 'zod'
import type { listReports as endpoint } from '../../../shared/api/reports.ts'
import type { Caller } from '../../caller.ts'
import { database } from '../../database/connection.ts'
import { accessibleWhere } from '../../models/accessible.ts'
import { Report } from '../../models/reports/report.ts'
import { reportRows } from './report-rows.ts'

/** Reports that the caller may see, newest first. */
export async function listReports({ search, after, limit }: z.infer<typeof endpoint.query>, caller: Caller) {
  const allowed = accessibleWhere(caller.ability, 'read', 'Report')
  if (!allowed) return { items: [], next: null }
  const where: WhereOptions[] = [allowed, ...(search ? [found(search)] : []), ...(after ? [{ id: { [Op.lt]: after } }] : [])]
  const reports = await Report.findAll({ where: { [Op.and]: where }, order: [['id', 'DESC']], limit: limit + 1, raw: true })
  const shown = reports.slice(0, limit)
  return { items: await reportRows(shown), next: reports.length > limit ? (shown.at(-1)?.id ?? null) : null }
}

/** By number, job, purchase order or customer. */
function found(search: string): WhereOptions {
  const like = database.escape(`%${search.replace(/[\\%_]/g, '\\$&')}%`)
  const text = `"Report"."number" || '/' || "Report"."revision" || ' ' || ("Report"."content" ->> 'jobNumber') || ' ' || ("Report"."content" ->> 'purchaseOrder') || ' ' || ("Report"."content" -> 'customer' ->> 'name')`
  return literal(`(${text}) ilike ${like}`)
}
