import { outside } from '../../../integrations/outside.ts'
import type { Session } from '../../../../shared/api/sessions.ts'
import { Company } from '../../../models/people/company.ts'
import { meView } from './me-view.ts'

/** Who is signed in, if anybody, and whose product this is. */
export async function readSession(personId: string | null): Promise<Session> {
  const { CROSSHEAD_DEMO: demo, MAIL_PAGE_URL: mailPage } = outside().settings
  const company = await Company.findOne({ raw: true })
  return { me: personId === null ? null : await meView(personId), company: company?.name ?? 'Crosshead', demo, mailPage: demo ? (mailPage ?? null) : null }
}
