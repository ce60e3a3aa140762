import { Link } from 'react-router-dom'
import type { JobRow } from '../../../../shared/api/jobs.ts'
import { jobStates } from '../../../../shared/api/words.ts'
import { currencySign, formatAmount, formatDay } from '../../../lib/format.ts'
import { Two } from '../../ui/table/two.tsx'
import type { Column } from '../../ui/table/column.ts'
import { Flag } from '../../ui/traveller/flag.tsx'
import { State, stateLabel } from '../../ui/traveller/state.tsx'
import { TravellerLine } from '../../ui/traveller/traveller-line.tsx'
import { When } from '../../ui/when.tsx'
import { dueWords } from './due-words.ts'
import { standingWords } from './standing-words.ts'

/** The columns of the list of jobs. `mayAnswer`: holds ask the person who looks; `manyCustomers`: the row says whose job it is. */
export function jobColumns({ zone, currency, mayAnswer, mayPay, manyCustomers }: { zone: string; currency: string; mayAnswer: boolean; mayPay: boolean; manyCustomers: boolean }): Column<JobRow>[] {
  return [
    {
      id: 'search', head: 'Job', name: 'Job', value: ({ number }) => number, sort: false, card: 'start', nowrap: true,
      filter: { kind: 'text', words: 'number, order, heat' },
      cell: ({ id, number, purchaseOrder }) => (
        <>
          <Link to={`/jobs/${id}`} className="mono font-medium">{number}</Link>
          <Two>{purchaseOrder || 'no order number'}</Two>
        </>
      ),
    },
    ...(manyCustomers ? [{ id: 'customer', head: 'Customer', value: ({ customerName }: JobRow) => customerName, sort: false, cell: ({ customerName, siteName }: JobRow) => <>{customerName}<Two>{siteName}</Two></> }] : []),
    {
      id: 'what', head: 'Samples and tests', sort: false, value: ({ what, tests }) => [what, tests].filter(Boolean).join('; '),
      cell: ({ what, tests }) => <>{what || 'no samples yet'}<Two>{tests}</Two></>,
    },
    {
      id: 'state', head: 'Traveller', name: 'State', sort: false, share: 33, value: ({ state }) => state,
      filter: { kind: 'choice', all: 'all states', choices: jobStates.map((value) => ({ value, label: stateLabel(value) })) },
      cell: (row) => <Standing row={row} mayAnswer={mayAnswer} />,
    },
    {
      id: 'due', head: 'Due', sort: 'only up', card: 'end', nowrap: true, value: ({ neededBy, expectedAt }) => neededBy ?? expectedAt,
      cell: (row) => {
        const { day, under, late } = dueWords(row, zone)
        return <>{day ? <When at={day} /> : <span className="text-quiet max-list:hidden">&nbsp;</span>}<Two late={late}>{under}</Two></>
      },
    },
    {
      id: 'price', head: 'Price', unit: currencySign(currency), numeric: true, sort: false, card: 'foot-start', nowrap: true, value: ({ totalMinor }) => totalMinor / 100,
      cell: ({ id, totalMinor, currency: own, state, money, waitsForPayment }) => (
        <>
          <span className="text-quiet list:hidden">{currencySign(own)} </span>{formatAmount(totalMinor, own)}
          <Two>{waitsForPayment ? (mayPay ? <Link to={`/jobs/${id}/order`}>Pay now</Link> : 'waits for payment') : state === 'draft' ? 'not placed' : money}</Two>
        </>
      ),
    },
    {
      id: 'report', head: 'Report', sort: false, card: 'foot-end', nowrap: true, value: ({ report }) => report?.number,
      cell: ({ report }) => report && (
        <>
          <Link to={`/reports?open=${report.id}`} className="mono">{report.number}</Link>
          {report.issuedAt && <Two>{formatDay(report.issuedAt, 'week', { zone })}</Two>}
        </>
      ),
    },
  ]
}

function Standing({ row: { state, holds, waitsForPayment, traveller }, mayAnswer }: { row: JobRow; mayAnswer: boolean }) {
  const held = holds === 1 ? 'one sample on hold' : `${holds} samples on hold`
  return (
    <>
      <span className="mb-0.5 flex flex-wrap justify-between gap-x-4">
        <State state={state} />
        <span className="text-13 leading-[1.375rem] text-quiet">
          {holds > 0 ? <Flag>{mayAnswer ? `${held}: answer needed` : held}</Flag> : waitsForPayment ? 'waits for payment' : standingWords(traveller)}
        </span>
      </span>
      {traveller.length > 0 ? <TravellerLine nodes={traveller} /> : <Two>no traveller until placed</Two>}
    </>
  )
}
