import { useId, useState, type ReactNode, type Ref } from 'react'
import { Button } from '../buttons/button.tsx'

/**
 * A picture with its caption and the same numbers as a table one press away. `children` draw inside an SVG of `width` by `height`
 * with the classes of picture.css: `curve` for the thing, `con` and `hair` for construction, `window`, `node`, `lab`, `ax`.
 */
export function PictureFrame({ title, aside, description, width, height, table, isMoved = false, children, className, ref }: {
  title: string
  aside?: ReactNode
  /** What the picture shows, in a sentence for those who do not see it. */
  description: string
  width: number
  height: number
  /** The same numbers. */
  table?: ReactNode
  /** Whether something in it can be moved, so that it is no mere image. */
  isMoved?: boolean
  children: ReactNode
  className?: string
  /** From `useWidth`. */
  ref?: Ref<HTMLElement>
}) {
  const [asTable, setAsTable] = useState(false)
  const id = useId()
  return (
    <figure ref={ref} className={className}>
      <figcaption className="mb-2.5 flex items-baseline justify-between gap-4 text-13">
        <b className="text-15 font-bold">{title}</b>
        <span className="flex items-baseline gap-4 text-quiet">
          {aside}
          {table && <Button kind="bare" size="tiny" aria-expanded={asTable} aria-controls={id} onClick={() => setAsTable(!asTable)}>{asTable ? 'As a picture' : 'As a table'}</Button>}
        </span>
      </figcaption>
      <div id={id}>
        {asTable ? <div className="max-h-[480px] overflow-y-auto" tabIndex={0} role="group" aria-label={title}>{table}</div> : (
          <svg className="pic" viewBox={`0 0 ${width} ${height}`} role={isMoved ? 'group' : 'img'} aria-label={description}>{children}</svg>
        )}
      </div>
    </figure>
  )
}
