import type { ReactNode } from 'react'
import { Popover } from '../feedback/popover.tsx'
import { classNames } from '../class-names.ts'
import { Derivation, type DerivationProps } from './derivation.tsx'

export type ExplainedProps = DerivationProps & {
  /** What stands on the page; the reported value unless given. */
  children?: ReactNode
  /** Opens elsewhere (a column at the right) instead of floating: called with the press. */
  onExplain?: () => void
  /** Whether that column shows this one. */
  open?: boolean
  className?: string
}

/** Any result is a button that says where it comes from: `<Explained result={result} verdict={verdict} />`. */
export function Explained({ children, onExplain, open, className, ...derivation }: ExplainedProps) {
  const { symbol, reported } = derivation.result
  const button = (
    <button type="button" aria-label={`${symbol} ${reported}: where this number comes from`} className={classNames('text-left decoration-1 underline-offset-4 hover:underline', className)} {...(onExplain && { onClick: onExplain, 'aria-expanded': open ?? false })}>
      {children ?? reported}
    </button>
  )
  if (onExplain) return button
  return (
    <Popover label="Where this number comes from" trigger={button}>
      <p className="mb-2 text-13 text-quiet">Where this number comes from</p>
      <Derivation {...derivation} />
    </Popover>
  )
}
