import { customerRole } from '../../../shared/access/customer-role.ts'
import { outside } from '../../integrations/outside.ts'
import { Company } from '../../models/people/company.ts'
import { Hold } from '../../models/jobs/hold.ts'
import { Job } from '../../models/jobs/job.ts'
import { Sample } from '../../models/jobs/sample.ts'
import { Person } from '../../models/people/person.ts'
import { sendOnce } from './send-once.ts'

/** Tells the clients of a job's customer that a sample waits for their answer, unless it has been given meanwhile. */
export async function mailHold(holdId: string): Promise<void> {
  const hold = await Hold.findByPk(holdId, { raw: true, rejectOnEmpty: true })
  if (hold.releasedAt || hold.answeredAt) return
  const job = await Job.findByPk(hold.jobId, { raw: true, rejectOnEmpty: true })
  const sample = hold.sampleId ? await Sample.findByPk(hold.sampleId, { raw: true }) : null
  const company = await Company.findOne({ raw: true })
  const clients = await Person.findAll({ where: { role: customerRole, customerId: hold.customerId, state: 'active' }, order: [['id', 'ASC']], raw: true })
  const what = sample ? `sample ${sample.number}` : `job ${job.number}`
  const failures: unknown[] = []
  for (const { id, email, name } of clients) {
    const text = [
      `Dear ${name},`, '', `${what} cannot go on: ${hold.reason}`, ...(hold.question ? ['', hold.question, ...hold.answers.map((answer) => `- ${answer}`)] : []), '',
      'Please answer here, so that work can go on:', `${outside().settings.BASE_URL}/jobs/${job.id}`, '', company?.name ?? 'Crosshead', '',
    ].join('\n')
    // one address that fails keeps nobody else waiting
    await sendOnce({ key: `hold:${holdId}:${id}`, to: email, subject: `Your answer is needed: ${what}`, text }).catch((error: unknown) => failures.push(error))
  }
  if (failures.length > 0) throw new AggregateError(failures, `${failures.length} of ${clients.length} mails about hold ${holdId} were not sent: ${failures.map(String).join('; ')}`)
}
