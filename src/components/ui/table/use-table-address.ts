import { useCallback, useMemo } from 'react'
import { useSearchParams } from 'react-router-dom'

export type TableAddress = {
  sort: { id: string; down: boolean } | undefined
  filters: Readonly<Record<string, string>>
  /** Columns shown or hidden against their default. */
  switched: readonly string[]
  setSort: (sort: { id: string; down: boolean } | undefined) => void
  setFilter: (id: string, value: string) => void
  setSwitched: (ids: readonly string[]) => void
  clear: () => void
}

const sortKey = 'sort'
const columnsKey = 'columns'

/**
 * Sort, filters and columns of a table in the page's address, so that a link opens the same view: `?sort=-due&material=42CrMo4`.
 * `name` tells two tables of one page apart. `ids` are the columns that may be named; other keys of the address are left alone.
 * A page whose server does the sorting reads the same address with the same call.
 */
export function useTableAddress(ids: readonly string[], name = ''): TableAddress {
  const [params, setParams] = useSearchParams()
  const known = ids.join(' ')
  const key = useCallback((part: string) => (name ? `${name}.${part}` : part), [name])
  const change = useCallback(
    (edit: (next: URLSearchParams) => void) =>
      setParams((now) => {
        const next = new URLSearchParams(now)
        edit(next)
        return next
      }, { replace: true, preventScrollReset: true }),
    [setParams],
  )
  return useMemo(() => {
    const all = known.split(' ')
    const put = (part: string, value: string) => change((next) => (value ? next.set(key(part), value) : next.delete(key(part))))
    const sorted = params.get(key(sortKey)) ?? ''
    const id = sorted.replace(/^-/, '')
    return {
      sort: all.includes(id) ? { id, down: sorted.startsWith('-') } : undefined,
      filters: Object.fromEntries(all.flatMap((one) => (params.get(key(one)) ? [[one, params.get(key(one)) ?? '']] : []))),
      switched: (params.get(key(columnsKey)) ?? '').split(' ').filter((one) => all.includes(one)),
      setSort: (sort) => put(sortKey, sort ? `${sort.down ? '-' : ''}${sort.id}` : ''),
      setFilter: put,
      setSwitched: (switched) => put(columnsKey, switched.join(' ')),
      clear: () => change((next) => [...all, sortKey].forEach((part) => next.delete(key(part)))),
    }
  }, [change, key, known, params])
}
