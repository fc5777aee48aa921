import type { ReactNode } from 'react'
import { rolesMay } from '@/lib/contracts/permissions'
import { currentActor } from '@/lib/server/auth/current-actor'
import { pagePerson } from '@/lib/server/auth/page-actor'
import { PartyPlaces } from './party-places'

export default async function PartyLayout({ children }: { children: ReactNode }) {
  const person = await pagePerson()
  const actor = person.partyId ? await currentActor() : undefined
  return (
    <>
      {actor && <PartyPlaces seesAudit={rolesMay(actor.roles, 'audit:read')} />}
      <main id="main" className="mx-auto max-w-5xl px-4 pt-8 pb-16 sm:px-6">
        {children}
      </main>
    </>
  )
}
