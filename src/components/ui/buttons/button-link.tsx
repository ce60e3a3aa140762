import { Link, type LinkProps } from 'react-router-dom'
import { classNames } from '../class-names.ts'
import { Icon, type IconName } from '../icon.tsx'
import { buttonLook, type ButtonLook } from './button-look.ts'

export type ButtonLinkProps = LinkProps & Omit<ButtonLook, 'refused'> & { icon?: IconName }

/** A link that looks like a button, for going to another page: `<ButtonLink to="/jobs/new" kind="main">New job</ButtonLink>`. */
export function ButtonLink({ kind, size, wide, square, icon, children, className, ...rest }: ButtonLinkProps) {
  return (
    <Link {...rest} className={classNames(buttonLook({ kind, size, wide, square }), className)}>
      {icon && <Icon name={icon} />}
      {children}
    </Link>
  )
}
