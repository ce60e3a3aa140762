type Point = readonly [number, number]

const gripHalf = 19
const gripLength = 28
const fillet = 12
const gaugeLength = 118
/** How far apart the halves of a parted piece lie. */
const gap = 5

/**
 * Measures of a round test piece standing upright, in drawing units: `strain` so far, `neck` from 0 to 1. Where it starts to neck the
 * even part stays as it is, so its width follows the strain up to 7 % only.
 */
export function pieceMeasures(top: number, strain: number, parted = false) {
  const gauge = gaugeLength * (1 + strain)
  const start = top + gripLength + fillet
  const mark = 8 * (1 + strain)
  return { gauge, start, end: start + gauge, half: 10.5 / Math.sqrt(1 + Math.min(strain, 0.07)), markTop: start + mark, markBottom: start + gauge - mark + (parted ? gap : 0) }
}

/** A test piece as it is drawn: outline with its waist, and the two marks of the gauge length. */
export function DrawnPiece({ x, top, strain, neck, parted = false }: { x: number; top: number; strain: number; neck: number; parted?: boolean }) {
  const { gauge, start, end, half, markTop, markBottom } = pieceMeasures(top, strain, parted)
  const middle = (start + end) / 2
  const waist = (y: number) => half * (1 - 0.36 * neck * Math.exp(-(((y - middle) / (0.13 * gauge)) ** 2)))
  const upper = [...gripSide(top, half, 1), ...steps(start, parted ? middle : end).map((y): Point => [waist(y), y])]
  const lower = steps(parted ? middle : end, end).map((y): Point => [waist(y), y + (parted ? gap : 0)])
  const foot = gripSide(end + fillet + gripLength + (parted ? gap : 0), half, -1).reverse()
  const least = waist(middle)
  const break_: Point[] = [[least * 0.55, 3.5], [-least * 0.5, 3.5]]
  const at = (points: readonly Point[]) => `M${points.map(([dx, y]) => `${(x + dx).toFixed(1)} ${y.toFixed(1)}`).join('L')}Z`
  const outlines = parted
    ? [at([...upper, ...break_.map(([dx, dy]): Point => [dx, middle + dy]), ...mirrored(upper)]), at([...lower, ...foot, ...mirrored([...lower, ...foot]), ...break_.toReversed().map(([dx, dy]): Point => [dx, middle + gap + dy])])]
    : [at([...upper, ...foot, ...mirrored([...upper, ...foot])])]
  return (
    <>
      {outlines.map((d, place) => <path key={place} d={d} className="metal" />)}
      <path d={`M${x - half} ${markTop}H${x + half}M${x - half} ${markBottom}H${x + half}`} className="hair" />
    </>
  )
}

/** The right side of a grip and its fillet, from the outer end inwards; `down` is 1 for the upper grip and -1 for the lower. */
function gripSide(outer: number, half: number, down: 1 | -1): Point[] {
  const shoulder = outer + down * gripLength
  const round = Array.from({ length: 7 }, (_, step): Point => [gripHalf + (half - gripHalf) * Math.sin((step / 6) * (Math.PI / 2)), shoulder + (down * fillet * step) / 6])
  return [[gripHalf, outer], [gripHalf, shoulder], ...round]
}
function steps(from: number, to: number): number[] {
  const count = Math.max(1, Math.round((to - from) / 2))
  return Array.from({ length: count + 1 }, (_, step) => from + ((to - from) * step) / count)
}
function mirrored(points: readonly Point[]): Point[] {
  return points.map(([dx, y]): Point => [-dx, y]).reverse()
}
