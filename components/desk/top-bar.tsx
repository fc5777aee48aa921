'use client'

import type { Route } from 'next'
import Link from 'next/link'
import { usePathname } from 'next/navigation'
import { Menu } from '@/components/ui/menu'
import { NavLinks } from '@/components/ui/nav-links'
import { ThemeToggle } from '@/components/ui/theme-toggle'
import { showToast } from '@/components/ui/toast'
import { switchParty } from '@/lib/client/account'
import { loadPage } from '@/lib/client/load-page'
import { signOutHere } from '@/lib/client/sign-in'
import type { OwnParty } from '@/lib/contracts/party'

const places = [
  { href: '/tours', label: 'Tours' },
  { href: '/directory', label: 'Directory' },
  { href: '/party', label: 'Party' },
] as const

const tell = (error: unknown) => showToast(error instanceof Error ? error.message : String(error))

export interface TopBarProps {
  personName: string
  party: { id: string; name: string } | null
  /** Every party of the person, the one in hand too. */
  parties: readonly OwnParty[]
}

/** The bar over every desk page: whose party, its places, and the person. A tour has a bar of its own beneath. */
export function TopBar({ personName, party, parties }: TopBarProps) {
  const path = usePathname()
  const others = parties.filter((other) => other.id !== party?.id)

  const take = async (partyId: string) => {
    try {
      await switchParty(partyId)
      loadPage('/tours')
    } catch (error) {
      tell(error)
    }
  }

  return (
    <header className="border-b border-line print:hidden">
      <div className="flex flex-wrap items-center gap-x-2 gap-y-0 px-4 py-1 sm:px-6">
        <Link href="/tours" className="name mr-2 flex min-h-control items-center text-xl">
          Hoopwright
        </Link>
        {(party || others.length > 0) && (
          // On a phone it fills the first row, so that the places and the person share the second.
          <div className="-ml-2 min-w-0 grow basis-[calc(100%-8rem)] sm:grow-0 sm:basis-auto">
            <Menu
              kind="quiet"
              label={<span className="max-w-44 truncate sm:max-w-64">{party?.name ?? 'Choose a party'}</span>}
              items={[
                ...others.map((other) => ({
                  key: other.id,
                  label: `Go to ${other.name}`,
                  onSelect: () => void take(other.id),
                })),
                { key: 'new', label: 'Make another party', href: '/party/new' as Route },
              ]}
            />
          </div>
        )}
        {party && (
          <NavLinks
            label="Places"
            className="sm:ml-2"
            links={places.map((place) => ({
              ...place,
              current: path === place.href || path.startsWith(`${place.href}/`),
            }))}
          />
        )}
        <div className="ml-auto hidden md:block">
          <ThemeToggle />
        </div>
        <div className="-mr-4 ml-auto md:ml-0">
          <Menu
            kind="quiet"
            align="end"
            label={<span className="max-w-24 truncate sm:max-w-48">{personName}</span>}
            items={[
              { key: 'you', label: 'Your devices and password', href: '/party/you' as Route },
              { key: 'out', label: 'Sign out', onSelect: () => void signOutHere().catch(tell) },
            ]}
          />
        </div>
      </div>
    </header>
  )
}
