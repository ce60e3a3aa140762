import type { ReactNode } from 'react'
import type { Outcome } from '../../../../shared/method/method.ts'
import { classNames } from '../class-names.ts'
import { Icon } from '../icon.tsx'

/** An outcome in words with its sign: `<Met outcome="pass">Meets 29.0 to 34.0 HRC</Met>`. Green appears nowhere. */
export function Met({ outcome, children, className }: { outcome: Outcome; children?: ReactNode; className?: string }) {
  const words = { pass: 'meets', fail: 'does not meet', undecided: 'undecided: limit inside ± U' }
  return (
    <span className={classNames('inline-flex items-center gap-1.5', outcome === 'fail' && 'font-medium text-red', className)}>
      {outcome !== 'undecided' && <Icon name={outcome === 'pass' ? 'check' : 'cross'} />}
      {children ?? words[outcome]}
    </span>
  )
}
