import type { ReactNode } from 'react'
import { TopBar } from '@/components/desk/top-bar'
import { ToastRegion } from '@/components/ui/toast-region'
import { DeskProviders } from '@/lib/client/live-provider'
import { currentSession } from '@/lib/server/auth/current-actor'
import { pagePerson } from '@/lib/server/auth/page-actor'
import { listOwnParties } from '@/lib/server/people/own-parties'

/** The desk: everything behind the sign-in. Whoever is in no party yet has the bar and the pages that need none. */
export default async function DeskLayout({ children }: { children: ReactNode }) {
  const person = await pagePerson()
  const session = await currentSession()
  const party = session?.partyId && session.partyName ? { id: session.partyId, name: session.partyName } : null
  return (
    <>
      <TopBar personName={person.name} party={party} parties={await listOwnParties(person)} />
      {party ? <DeskProviders>{children}</DeskProviders> : children}
      <ToastRegion />
    </>
  )
}
