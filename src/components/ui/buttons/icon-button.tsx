import type { ComponentPropsWithRef } from 'react'
import { classNames } from '../class-names.ts'
import { Icon, type IconName } from '../icon.tsx'

/** A button that is only an icon; `label` is its name for those who listen and its tooltip. */
export function IconButton({ icon, label, className, ...rest }: { icon: IconName; label: string } & Omit<ComponentPropsWithRef<'button'>, 'children' | 'aria-label' | 'disabled'>) {
  return (
    <button type="button" title={label} aria-label={label} {...rest} className={classNames('grid size-control flex-none place-items-center rounded transition-colors duration-quick hover:bg-wash', className)}>
      <Icon name={icon} />
    </button>
  )
}
