import type { Transaction } from 'sequelize'
import { inputOf } from '../../../shared/method/entries.ts'
import type { Method } from '../../../shared/method/method.ts'
import { Reading } from '../../models/runs/reading.ts'
import { Strike } from '../../models/runs/strike.ts'
import type { Test } from '../../models/jobs/test.ts'

export type KeptReading = { reading: Reading; strike: Strike | null }

/** Everything kept in a run, in the order it was kept, with what was struck out. */
export async function readingsOf(testRunId: string, tx?: Transaction): Promise<KeptReading[]> {
  // one after the other: a transaction has one connection
  const readings = await Reading.findAll({ where: { testRunId }, order: [['createdAt', 'ASC'], ['id', 'ASC']], raw: true, transaction: tx })
  const strikes = await Strike.findAll({ where: { testRunId }, raw: true, transaction: tx })
  const struck = new Map(strikes.map((strike) => [strike.readingId, strike]))
  return readings.map((reading) => ({ reading, strike: struck.get(reading.id) ?? null }))
}

/** The engine's input: what was ordered and every reading that is not struck out. */
export function engineInput(method: Method, test: Test, kept: readonly KeptReading[]) {
  return inputOf(test.parameters, kept.filter(({ strike }) => !strike).map(({ reading }) => reading), method.isSet)
}
