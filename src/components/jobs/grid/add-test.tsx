import { useQuery } from '@tanstack/react-query'
import type { ReactNode } from 'react'
import type { Piece } from '../../../../shared/method/piece.ts'
import { methods } from '../../../../shared/methods.ts'
import { catalogueQuery } from '../../../api/catalogue.ts'
import { formatMoney } from '../../../lib/format.ts'
import { Menu, type MenuItem } from '../../ui/feedback/menu.tsx'

/** Adds a column: any of the methods that the lab offers, with its price. `piece` is a sample to start the parameters from. */
export function AddTest({ piece, trigger, onAdd }: { piece: Piece | undefined; trigger: ReactNode; onAdd: (methodId: string, parameters: Record<string, unknown>) => void }) {
  const { data } = useQuery(catalogueQuery)
  const offered = methods.flatMap((method) => data?.offers.filter(({ methodId }) => methodId === method.id).map((offer) => ({ method, offer })) ?? [])
  const items: MenuItem[] = offered.map(({ method, offer }) => ({
    label: <>{method.title}<span className="block text-13 text-quiet">{method.standards.join(', ')}</span></>, hint: formatMoney(offer.priceMinor, offer.currency),
    onSelect: () => onAdd(method.id, method.suggest(piece)),
  }))
  return <Menu label="Add a test" trigger={trigger} items={items.length > 0 ? items : [{ kind: 'words', label: data ? 'The lab offers no tests at present.' : 'Loading what the lab offers' }]} />
}
