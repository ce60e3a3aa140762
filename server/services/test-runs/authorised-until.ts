import { DateTime } from 'luxon'
import { Op, type Transaction } from 'sequelize'
import type { Right } from '../../../shared/api/words.ts'
import { Authorisation } from '../../models/people/authorisation.ts'

/** The last day of a person's right to do something with a method, today or later at the site; null when there is none. */
export async function authorisedUntil(personId: string, methodId: string, right: Right, timeZone: string, tx?: Transaction): Promise<string | null> {
  const today = DateTime.now().setZone(timeZone).toFormat('yyyy-MM-dd')
  const latest = await Authorisation.findOne({ where: { personId, methodId, right, until: { [Op.gte]: today } }, order: [['until', 'DESC']], raw: true, transaction: tx })
  return latest?.until ?? null
}
