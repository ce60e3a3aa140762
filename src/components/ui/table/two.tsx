import type { ReactNode } from 'react'

/** The second, quiet line of a cell: `<Two>3 days in hand</Two>`, red for what is late. */
export function Two({ late = false, children }: { late?: boolean; children: ReactNode }) {
  return <span className={late ? 'two red' : 'two'}>{children}</span>
}
