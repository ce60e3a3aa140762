import { QueryTypes, type Transaction } from 'sequelize'
import { database } from '../../database/connection.ts'

/**
 * The next number of a series in its year, such as "J-26-00417". The row stays locked until commit, so that a series has no
 * number twice, and no gap when the transaction is given up.
 */
export async function nextNumber(series: 'J' | 'I' | 'R', now: Date, tx: Transaction): Promise<string> {
  const year = now.getUTCFullYear()
  const [row] = await database.query<{ last: number }>(
    'insert into numbers (series, year, last) values ($1, $2, 1) on conflict (series, year) do update set last = numbers.last + 1 returning last',
    { bind: [series, year], type: QueryTypes.SELECT, transaction: tx },
  )
  if (!row) throw new Error(`the series ${series} gave no number`)
  return `${series}-${String(year % 100).padStart(2, '0')}-${String(row.last).padStart(5, '0')}`
}
