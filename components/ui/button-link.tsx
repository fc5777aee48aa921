import type { Route } from 'next'
import Link from 'next/link'
import type { ComponentProps } from 'react'
import { buttonClasses } from './button-classes'
import type { ButtonKind } from './button-classes'

export interface ButtonLinkProps extends Omit<ComponentProps<'a'>, 'href'> {
  href: Route
  kind?: ButtonKind
}

/** A link that stands as a button. */
export function ButtonLink({ kind = 'secondary', className, href, ...rest }: ButtonLinkProps) {
  return <Link {...rest} href={href} className={buttonClasses(kind, className)} />
}
