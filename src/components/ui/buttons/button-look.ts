import { classNames } from '../class-names.ts'

/** `main` once on a page; `soft` for what is nearby; `bare` reads as a link; `danger` for what cannot be undone. */
export type ButtonKind = 'main' | 'plain' | 'soft' | 'bare' | 'danger'
/** `tiny` in notes and tables, `big` at the bench. */
export type ButtonSize = 'tiny' | 'normal' | 'big'
export type ButtonLook = { kind?: ButtonKind; size?: ButtonSize; refused?: boolean; wide?: boolean; square?: boolean }

const kinds: Record<ButtonKind, string> = {
  main: 'border-ink bg-ink text-paper font-medium hover:bg-[color-mix(in_srgb,var(--ink)_86%,var(--paper))]',
  plain: 'border-ink font-medium hover:bg-wash',
  soft: 'border-edge hover:bg-wash',
  bare: 'border-transparent px-2! underline decoration-1 underline-offset-3 hover:bg-wash',
  danger: 'border-red text-red font-medium hover:bg-red-wash',
}
const sizes: Record<ButtonSize, string> = {
  tiny: 'min-h-small px-2.5 text-13',
  normal: 'min-h-control px-4',
  big: 'min-h-touch px-5 text-17',
}

/** The classes of a button, for buttons and for links that look like one. */
export function buttonLook({ kind = 'plain', size = 'normal', refused = false, wide = false, square = false }: ButtonLook): string {
  const refusedLook = classNames('border-line text-quiet font-medium cursor-not-allowed!', kind === 'main' && 'bg-wash')
  return classNames(
    'inline-flex items-center justify-center gap-2 rounded border text-center no-underline transition-colors duration-quick',
    sizes[size],
    square && 'w-small px-0!',
    wide && 'w-full',
    refused ? refusedLook : kinds[kind],
  )
}
