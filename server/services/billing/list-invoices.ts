import { Op, type WhereOptions } from 'sequelize'
import { validate } from 'uuid'
import { Problem } from '../../../shared/problems.ts'
import type { Caller } from '../../caller.ts'
import { accessibleWhere } from '../../models/accessible.ts'
import { Invoice } from '../../models/billing/invoice.ts'
import { invoiceViews } from './invoice-views.ts'

/** Invoices that the caller may see, newest first. */
export async function listInvoices({ after, limit }: { after?: string | undefined; limit: number }, caller: Caller) {
  const allowed = accessibleWhere(caller.ability, 'read', 'Invoice')
  if (!allowed) return { items: [], next: null }
  if (after !== undefined && !validate(after)) throw new Problem('not-acceptable', 'this is not where a part of this list begins', { after: 'take it from the answer before' })
  const where: WhereOptions[] = [allowed, ...(after ? [{ id: { [Op.lt]: after } }] : [])]
  const rows = await Invoice.findAll({ where: { [Op.and]: where }, order: [['id', 'DESC']], limit: limit + 1, raw: true })
  const shown = rows.slice(0, limit)
  return { items: await invoiceViews(shown), next: rows.length > limit ? (shown.at(-1)?.id ?? null) : null }
}
