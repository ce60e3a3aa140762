import type { ReactNode } from 'react'
import { classNames } from './class-names.ts'

/** A key, as printed on the keyboard: `<Kbd>Ctrl Enter</Kbd>`. */
export function Kbd({ children, className }: { children: ReactNode; className?: string }) {
  return (
    <kbd
      className={classNames(
        'inline-block min-w-5 whitespace-nowrap rounded border border-edge px-1.25 text-center font-mono text-[0.75rem]/[1.125rem] font-normal tracking-normal text-quiet',
        className,
      )}
    >
      {children}
    </kbd>
  )
}
