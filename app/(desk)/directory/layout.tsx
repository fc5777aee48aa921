import type { Metadata } from 'next'
import { DirectoryPlaces } from '@/components/directory/directory-places'
import { RefreshOnLive } from '@/lib/client/live-provider'
import { pageActor } from '@/lib/server/auth/page-actor'

export const metadata: Metadata = { title: { default: 'Directory', template: '%s · Hoopwright' } }

export default async function DirectoryLayout({ children }: LayoutProps<'/directory'>) {
  const actor = await pageActor()
  return (
    <>
      <RefreshOnLive topics={[`directory:${actor.partyId}`]} />
      <DirectoryPlaces />
      <main id="main" className="mx-auto max-w-5xl px-4 py-8 sm:px-6">
        {children}
      </main>
    </>
  )
}
