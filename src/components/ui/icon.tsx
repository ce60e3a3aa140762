import { classNames } from './class-names.ts'

/** Line icons on a grid of 16 px: one path each, drawn with the colour of the text around them. */
const paths = {
  check: 'M2.5 8.5l3.5 3.5 7.5-8',
  cross: 'M3 3l10 10M13 3L3 13',
  plus: 'M8 2v12M2 8h12',
  minus: 'M2 8h12',
  stop: 'M5 1.5h6L14.5 5v6L11 14.5H5L1.5 11V5zM8 4.5V9M8 10.5V12',
  warning: 'M8 2L15 14H1zM8 6.5v3.5M8 11.2v1.3',
  info: 'M14.2 8A6.2 6.2 0 1 1 1.8 8a6.2 6.2 0 0 1 12.4 0zM8 7v4.5M8 4.3v1.4',
  clock: 'M14.2 8A6.2 6.2 0 1 1 1.8 8a6.2 6.2 0 0 1 12.4 0zM8 4v4l3 2',
  down: 'M4 6l4 4 4-4',
  up: 'M4 10l4-4 4 4',
  left: 'M10 4L6 8l4 4',
  right: 'M6 4l4 4-4 4',
  search: 'M11.5 7a4.5 4.5 0 1 1-9 0 4.5 4.5 0 0 1 9 0zM10.5 10.5L14 14',
  scan: 'M2 5V2h3M11 2h3v3M14 11v3h-3M5 14H2v-3M5 5v6M8 5v6M11 5v6',
  menu: 'M2 4h12M2 8h12M2 12h12',
  download: 'M8 2v9M4 7.5L8 11.5l4-4M2 14.5h12',
  drop: 'M8 1.5v8M4.5 6L8 9.5 11.5 6M1.5 10v4.5h13V10',
  attach: 'M13 7.5L7.5 13a3.5 3.5 0 01-5-5L8.5 2a2.3 2.3 0 013.3 3.3L6 11',
  print: 'M4 6V2h8v4M4 12H2V6h12v6h-2M4 9.5h8v5H4z',
  page: 'M3 1.5h6.5L13 5v9.5H3zM9.5 1.5V5H13',
  paste: 'M5 2.5h6v2H5zM5 3.5H3v11h10v-11h-2',
  person: 'M11 5a3 3 0 1 1-6 0 3 3 0 0 1 6 0zM2 14.5c0-3.3 2.4-5 6-5s6 1.7 6 5',
  columns: 'M2 2.5h12v11H2zM6 2.5v11M10 2.5v11',
  mail: 'M1.5 3.5h13v9h-13zM1.5 4l6.5 5 6.5-5',
  lock: 'M3.5 7h9v7h-9zM5.5 7V4.5a2.5 2.5 0 0 1 5 0V7',
  pen: 'M2.5 13.5l.8-3.3L10.8 2.7l2.5 2.5-7.5 7.5zM9.3 4.2l2.5 2.5',
  again: 'M13.5 8A5.5 5.5 0 1 1 11.6 3.8M11.8 1v3h-3',
  pause: 'M5 3v10M11 3v10',
  dots: 'M3 8h.01M8 8h.01M13 8h.01',
} as const

export type IconName = keyof typeof paths

/**
 * `<Icon name="check" />`: decorative; the words beside it carry the meaning. With `title` it is spoken as an image.
 * `className` may change its size, which is 16 px.
 */
export function Icon({ name, title, className }: { name: IconName; title?: string; className?: string }) {
  return (
    <svg
      className={classNames('size-4 flex-none fill-none stroke-current', className)}
      viewBox="0 0 16 16"
      strokeWidth={name === 'dots' ? 2.5 : 1.5}
      strokeLinecap={name === 'dots' ? 'square' : 'butt'}
      {...(title ? { role: 'img', 'aria-label': title } : { 'aria-hidden': true })}
    >
      <path d={paths[name]} />
    </svg>
  )
}
