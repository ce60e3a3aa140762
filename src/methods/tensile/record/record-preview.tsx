import { decimalNumber, type TextTable } from '../../../../shared/tensile/record.ts'
import { ScrollSideways } from '../../../components/ui/table/scroll-sideways.tsx'

const shown = 6

/** The first rows as they were cut; chosen columns stand out, and what is no number there is red. */
export function RecordPreview({ table: { names, columns }, chosen, decimal }: { table: TextTable; chosen: readonly (string | undefined)[]; decimal: '.' | ',' }) {
  return (
    <ScrollSideways label="First rows of the record">
      <table className="table text-13" aria-label="First rows of the record">
        <thead><tr>{names.map((name) => <th key={name} scope="col" className={chosen.includes(name) ? 'num' : 'num font-normal! text-quiet'}>{name}</th>)}</tr></thead>
        <tbody>
          {Array.from({ length: Math.min(shown, columns[0]?.length ?? 0) }, (_, row) => (
            <tr key={row}>
              {names.map((name, place) => {
                const cell = columns[place]?.[row] ?? ''
                const isChosen = chosen.includes(name)
                return <td key={name} className={`num mono ${!isChosen ? 'text-quiet' : decimalNumber(cell, decimal) === undefined ? 'text-red' : ''}`}>{cell}</td>
              })}
            </tr>
          ))}
        </tbody>
      </table>
    </ScrollSideways>
  )
}
