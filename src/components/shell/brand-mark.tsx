/** The mark: two crossheads with a waisted test piece between them. */
export function BrandMark({ className = 'size-6' }: { className?: string }) {
  return (
    <svg className={`flex-none fill-current ${className}`} viewBox="0 0 24 24" aria-hidden>
      <path d="M2 2h20v6h-5c-2 0-3 1-3 3v.6l-4-2C9.9 8.5 9 8 7 8H2zM22 22H2v-6h5c2 0 3-1 3-3v-.6l4 2c.1 1.1 1 1.6 3 1.6h5z" />
    </svg>
  )
}
