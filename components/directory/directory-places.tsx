'use client'

import { useSelectedLayoutSegment } from 'next/navigation'
import { NavLinks } from '@/components/ui/nav-links'

const places = [
  { segment: 'venues', href: '/directory/venues', label: 'Venues' },
  { segment: 'suppliers', href: '/directory/suppliers', label: 'Suppliers' },
  { segment: 'players', href: '/directory/players', label: 'Players' },
] as const

/** The three lists of the directory. */
export function DirectoryPlaces() {
  const current = useSelectedLayoutSegment()
  return (
    <div className="border-b-2 border-ink px-4 sm:px-6 print:hidden">
      <NavLinks
        label="Directory"
        links={places.map(({ segment, href, label }) => ({ href, label, current: segment === current }))}
      />
    </div>
  )
}
