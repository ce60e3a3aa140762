import type { Picture } from '../../../../shared/method/picture.ts'
import { formatNumber } from '../../../lib/format.ts'
import type { Column } from '../table/column.ts'
import { PlainTable } from '../table/plain-table.tsx'
import { Axes } from './axes.tsx'
import { MaskedLabel } from './masked-label.tsx'
import { PictureFrame } from './picture-frame.tsx'
import { extent, linePath, plane } from './plane.ts'
import { useWidth } from './use-width.ts'

const lines = { curve: 'curve', construction: 'con', dashed: 'con dash' }

/** The picture of a run as the method gives it: a stress–strain curve with its construction, a hardness traverse. */
export function RunPicture({ picture, height = 380, className }: { picture: Picture; height?: number; className?: string }) {
  const [ref, width] = useWidth(720)
  const points = picture.lines.flatMap((line) => line.points)
  const drawn = plane({
    width,
    height,
    x: zeroed(extent([...points.map(([x]) => x), ...picture.marks.map((mark) => mark.x)])),
    y: zeroed(extent([...points.map(([, y]) => y), ...picture.marks.map((mark) => mark.y)])),
    round: true,
  })
  const { x, y, margins } = drawn
  const right = width - margins.right
  const band = picture.window
  return (
    <PictureFrame ref={ref} title={picture.title} width={width} height={height} className={className} description={describe(picture)} table={<Numbers picture={picture} />}>
      {band && <rect x={margins.left} y={y(band.to)} width={right - margins.left} height={Math.max(0, y(band.from) - y(band.to))} className="window" />}
      <Axes plane={drawn} xAxis={picture.x} yAxis={picture.y} />
      {picture.lines.map((line, place) => <path key={place} d={linePath(line.points, drawn)} className={lines[line.kind]} />)}
      {picture.marks.map((mark, place) => {
        const late = x(mark.x) > right - 120
        return (
          <g key={place}>
            <MaskedLabel x={x(mark.x) + (late ? -12 : 12)} y={y(mark.y) + (y(mark.y) > height - margins.bottom - 36 ? -12 : 28)} anchor={late ? 'end' : 'start'} text={mark.label} />
            <circle cx={x(mark.x)} cy={y(mark.y)} r={5} className="node" />
          </g>
        )
      })}
    </PictureFrame>
  )
}

/** Pictures start at nought when nothing lies below it: a curve cut off at its foot misleads. */
function zeroed([low, high]: [number, number]): [number, number] {
  return low > 0 && low < high * 0.6 ? [0, high] : [low, high]
}

function describe(picture: Picture): string {
  const marks = picture.marks.map((mark) => mark.label).join(', ')
  return `${picture.title}: ${picture.y.label} against ${picture.x.label}${marks ? `, marked ${marks}` : ''}. The numbers are in its table.`
}

/** At most 200 rows: the whole record is in the run's file. */
function Numbers({ picture }: { picture: Picture }) {
  const points = picture.lines.filter((line) => line.kind === 'curve').flatMap((line) => line.points)
  const every = Math.max(1, Math.ceil(points.length / 200))
  const rows = [...picture.marks.map((mark) => ({ what: mark.label, x: mark.x, y: mark.y })), ...points.filter((_, place) => place % every === 0).map(([x, y], place) => ({ what: `point ${place * every + 1}`, x, y }))]
  const columns: Column<(typeof rows)[number]>[] = [
    { id: 'what', head: 'Point', cell: (row) => row.what },
    { id: 'x', head: picture.x.label, unit: picture.x.unit, numeric: true, cell: (row) => formatNumber(Number(row.x.toPrecision(6))) },
    { id: 'y', head: picture.y.label, unit: picture.y.unit, numeric: true, cell: (row) => formatNumber(Number(row.y.toPrecision(6))) },
  ]
  return <PlainTable caption={picture.title} columns={columns} rows={rows} rowId={(row) => row.what} />
}
