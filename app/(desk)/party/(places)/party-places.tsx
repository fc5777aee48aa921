'use client'

import type { Route } from 'next'
import { usePathname } from 'next/navigation'
import { NavLinks } from '@/components/ui/nav-links'

export function PartyPlaces({ seesAudit }: { seesAudit: boolean }) {
  const path = usePathname()
  const places = [
    { href: '/party', label: 'Members' },
    { href: '/party/settings', label: 'Settings' },
    { href: '/party/gauges', label: 'Gauges' },
    ...(seesAudit ? [{ href: '/party/audit', label: 'Audit trail' }] : []),
    { href: '/party/you', label: 'You' },
  ]
  return (
    <div className="border-b-2 border-ink px-4 sm:px-6 print:hidden">
      <NavLinks
        label="Party"
        links={places.map((place) => ({ ...place, href: place.href as Route, current: path === place.href || path.startsWith(`${place.href}/`) && place.href !== '/party' }))}
      />
    </div>
  )
}
