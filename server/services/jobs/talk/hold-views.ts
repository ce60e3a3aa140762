import { Op, type Transaction } from 'sequelize'
import type { Hold as HoldInJob } from '../../../../shared/api/jobs.ts'
import type { Hold } from '../../../models/jobs/hold.ts'
import { Sample } from '../../../models/jobs/sample.ts'

/** Holds as people see them, with the numbers of their samples. */
export async function holdViews(holds: readonly Hold[], tx?: Transaction): Promise<HoldInJob[]> {
  const ids = holds.flatMap(({ sampleId }) => sampleId ?? [])
  const samples = ids.length === 0 ? [] : await Sample.findAll({ where: { id: { [Op.in]: ids } }, attributes: ['id', 'number'], raw: true, transaction: tx })
  return holds.map(({ id, jobId, sampleId, reason, question, answers, answer, createdAt, answeredAt, releasedAt, version }) => ({
    id, jobId, sampleId, sampleNumber: samples.find((sample) => sample.id === sampleId)?.number ?? null, reason, question, answers, answer,
    placedAt: createdAt.toISOString(), answeredAt: answeredAt?.toISOString() ?? null, releasedAt: releasedAt?.toISOString() ?? null, version,
  }))
}
