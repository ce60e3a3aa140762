/** How far a piece of work is, 0 to 100. Its words stand beside it; `label` says what it measures. */
export function Meter({ percent, label, className }: { percent: number; label: string; className?: string }) {
  const done = Math.min(100, Math.max(0, percent))
  return (
    <span className={`meter ${className ?? ''}`} role="progressbar" aria-label={label} aria-valuenow={Math.round(done)} aria-valuemin={0} aria-valuemax={100}>
      <i style={{ '--done': done }} />
    </span>
  )
}
