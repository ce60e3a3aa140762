import type { Picture } from '../method/picture.ts'
import type { ReportContent } from './content.ts'

/** More points than these cannot be told apart on paper. */
const mostPoints = 400

/** A picture with its curves thinned for paper: of each stretch along the record the points with the least and the greatest y, so that no peak is lost. */
export function thinPicture(picture: Picture): ReportContent['pictures'][number]['picture'] {
  return { ...picture, marks: [...picture.marks], lines: picture.lines.map(({ kind, points }) => ({ kind, points: thin(points).map(([x, y]): [number, number] => [rounded(x), rounded(y)]) })) }
}

function thin(points: readonly (readonly [number, number])[]): readonly (readonly [number, number])[] {
  if (points.length <= mostPoints) return points
  const stretch = Math.ceil(points.length / (mostPoints / 2))
  const kept: (readonly [number, number])[] = []
  for (let from = 0; from < points.length; from += stretch) {
    const part = points.slice(from, from + stretch)
    const ys = part.map(([, y]) => y)
    const [least, most] = [ys.indexOf(Math.min(...ys)), ys.indexOf(Math.max(...ys))].sort((a, b) => a - b)
    kept.push(part[least!]!, ...(most === least ? [] : [part[most!]!]))
  }
  const [first, last] = [points[0]!, points.at(-1)!]
  return [...(kept[0] === first ? [] : [first]), ...kept, ...(kept.at(-1) === last ? [] : [last])]
}

const rounded = (value: number) => Number(value.toPrecision(6))
