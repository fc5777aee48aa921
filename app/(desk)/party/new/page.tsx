import type { Metadata } from 'next'
import { pagePerson } from '@/lib/server/auth/page-actor'
import { NewPartyForm } from './new-party-form'

export const metadata: Metadata = { title: 'Make a party' }

export default async function NewPartyPage() {
  const person = await pagePerson()
  return (
    <main id="main" className="mx-auto max-w-xl px-4 py-10 sm:px-6">
      <h1 className="text-4xl">{person.partyId ? 'Make another party' : 'Make your party'}</h1>
      <p className="mt-3 text-soft">
        A party is everyone on the road together: its tours, kits, plots and mails are its own. You become its owner and
        invite the others.
      </p>
      {!person.partyId && (
        <p className="mt-2 text-soft">Were you invited to one? Then open the link in that mail instead.</p>
      )}
      <NewPartyForm />
    </main>
  )
}
