import { Link } from 'react-router-dom'
import type { Job } from '../../../../shared/api/jobs.ts'
import { fileAddress } from '../../../api/people.ts'
import { reportFile } from '../../../api/reports.ts'
import { currencySign, formatBytes, formatDay } from '../../../lib/format.ts'
import { PriceLines } from '../../billing/price-lines.tsx'
import { Icon } from '../../ui/icon.tsx'
import { SideSection } from '../../ui/side-section.tsx'
import { State } from '../../ui/traveller/state.tsx'
import { When } from '../../ui/when.tsx'
import { dueWords } from '../list/due-words.ts'
import { Attachments } from '../order/attachments.tsx'

/** The day the job is due, and how that stands. */
export function DueSection({ job }: { job: Job }) {
  const { order: { neededBy }, timeZone: zone, promisedAt, expectedAt, reports } = job
  const newest = reports.find(({ state }) => state !== 'superseded') ?? null
  const { day, under, late } = dueWords({ state: job.state, neededBy, expectedAt, lateDays: job.lateDays, report: newest }, zone)
  const shown = day ?? promisedAt
  return (
    <SideSection title={shown ? `Due ${formatDay(shown, 'long', { zone })}` : 'Due'}>
      <p className={late ? 'font-medium text-red' : undefined}>{under.charAt(0).toUpperCase() + under.slice(1)}.</p>
      {promisedAt && <p className="text-13 text-quiet">Promised for <When at={promisedAt} zone={zone} />{neededBy && <>, needed by <When at={neededBy} /></>}{expectedAt && job.state !== 'reported' && job.state !== 'closed' && <>, expected <When at={expectedAt} zone={zone} /></>}.</p>}
    </SideSection>
  )
}

export function MoneySection({ job }: { job: Job }) {
  const total = { unpaid: 'To pay', paid: 'Paid by card', 'on account': 'On account', 'part refunded': 'Part refunded', refunded: 'Refunded' }[job.money]
  return (
    <SideSection title="Money" aside={currencySign(job.currency)}>
      <PriceLines {...job} total={total} />
      <p className="text-13 text-quiet">
        {job.order.purchaseOrder && <>Purchase order {job.order.purchaseOrder}. </>}
        {job.invoiceId && <Link to={`/invoices/${job.invoiceId}`}>Invoice</Link>}
      </p>
    </SideSection>
  )
}

export function ReportsSection({ job }: { job: Job }) {
  return (
    <SideSection title="Reports">
      {job.reports.length === 0 && <p className="text-quiet">None yet{job.expectedAt && job.state !== 'cancelled' ? <>, expected <When at={job.expectedAt} zone={job.timeZone} /></> : ''}.</p>}
      <ul className="grid gap-2">
        {job.reports.map(({ id, number, state, issuedAt }) => (
          <li key={id} className="flex gap-2.5">
            <Icon name="page" className="mt-0.75 text-quiet" />
            <span>
              {state === 'being made' ? <span className="mono">{number}</span> : <a href={reportFile(id)} className="mono">{number}</a>}
              <small className="block text-13 text-quiet"><State state={state} />{issuedAt && state !== 'being made' && <>, <When at={issuedAt} zone={job.timeZone} /></>}</small>
            </span>
          </li>
        ))}
      </ul>
    </SideSection>
  )
}

/** Drawings of the customer, photos and records of the lab. */
export function FilesSection({ job, mayAdd }: { job: Job; mayAdd: boolean }) {
  const others = job.files.filter(({ purpose }) => purpose !== 'attachment')
  if (others.length === 0 && job.files.length === 0 && !mayAdd) return null
  return (
    <SideSection title="Files">
      {mayAdd ? <Attachments job={job} keep /> : <FileList files={job.files.filter(({ purpose }) => purpose === 'attachment')} />}
      <FileList files={others} />
    </SideSection>
  )
}

function FileList({ files }: { files: Job['files'] }) {
  return (
    <ul className="text-13">
      {files.map(({ id, name, size, purpose }) => (
        <li key={id} className="flex items-center gap-2">
          <Icon name="page" className="text-quiet" />
          <a href={fileAddress(id)} className="min-w-0 flex-1 truncate py-2">{name}</a>
          <span className="whitespace-nowrap text-quiet">{purpose === 'attachment' ? '' : `${purpose}, `}{formatBytes(size)}</span>
        </li>
      ))}
    </ul>
  )
}
