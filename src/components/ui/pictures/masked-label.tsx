/** Words in a picture on a patch of its ground, so that lines do not run through them. `sub` marks an index: "R|m" is R with a lowered m. */
export function MaskedLabel({ x, y, text, anchor = 'start', look = 'lab' }: { x: number; y: number; text: string; anchor?: 'start' | 'middle' | 'end'; look?: string }) {
  const plain = text.replaceAll('|', '')
  const width = plain.length * (look === 'big' ? 10.5 : 6.9) + 8
  const left = anchor === 'start' ? x - 4 : anchor === 'middle' ? x - width / 2 : x - width + 4
  const size = look === 'big' ? 26 : 19
  return (
    <g>
      <rect x={left} y={y - size * 0.74} width={width} height={size} className="mask" />
      <text x={x} y={y} textAnchor={anchor} className={look}>
        {text.split('|').map((part, place) => <tspan key={place} className={place % 2 ? 'sub' : undefined} dy={place % 2 ? 3 : place ? -3 : undefined}>{part}</tspan>)}
      </text>
    </g>
  )
}
