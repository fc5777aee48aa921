import type { Route } from 'next'
import Link from 'next/link'
import type { ReactNode } from 'react'
import { classes } from './classes'

export interface NavLink {
  href: Route
  label: ReactNode
  current?: boolean
}

export interface NavLinksProps {
  /** What these links move between ("This rig"). */
  label: string
  links: readonly NavLink[]
  className?: string
}

/** The places beside this one; the one that is open is underlined in spike and named to screen readers. */
export function NavLinks({ label, links, className }: NavLinksProps) {
  return (
    <nav aria-label={label} className={className}>
      <ul className="flex flex-wrap gap-x-5">
        {links.map((link) => (
          <li key={link.href}>
            <Link
              href={link.href}
              aria-current={link.current ? 'page' : undefined}
              className={classes(
                'flex min-h-control items-center border-b-[3px] pt-[3px] font-bold',
                link.current ? 'border-spike' : 'border-transparent hover:border-ink',
              )}
            >
              {link.label}
            </Link>
          </li>
        ))}
      </ul>
    </nav>
  )
}
