/** A two-dimensional code that came as SVG, drawn as a picture so that nothing in it can run. */
export function CodePicture({ svg, label, className }: { svg: string; label: string; className?: string }) {
  return <img src={`data:image/svg+xml,${encodeURIComponent(svg)}`} alt={label} className={className} />
}
