import type { Metadata } from 'next'
import { notFound } from 'next/navigation'
import { AdvancePage } from '@/components/advance/advance-page'
import { RefreshOnLive } from '@/lib/client/live-provider'
import { idSchema } from '@/lib/contracts/common'
import { rolesMay } from '@/lib/contracts/permissions'
import { readAdvance } from '@/lib/server/advance/read-advance'
import { pageActor } from '@/lib/server/auth/page-actor'
import { pageAnswer } from '@/lib/server/auth/page-answer'

export const metadata: Metadata = { title: 'Advance' }

/** The advance of one show; answers arrive while it is open. */
export default async function ShowAdvancePage({ params }: PageProps<'/tours/[tourId]/shows/[showId]/advance'>) {
  const { tourId, showId } = await params
  const actor = await pageActor()
  if (!idSchema.safeParse(tourId).success || !idSchema.safeParse(showId).success) notFound()
  const view = await pageAnswer(readAdvance(actor, { tourId, of: { kind: 'show', showId } }))
  return (
    <>
      <RefreshOnLive topics={[`advance:${showId}`, `directory:${actor.partyId}`]} />
      <AdvancePage
        view={view}
        maySend={rolesMay(actor.roles, 'advance:send')}
        maySettle={rolesMay(actor.roles, 'answer:settle')}
        mayTakeDown={rolesMay(actor.roles, 'answer:take-down')}
        mayWithdraw={rolesMay(actor.roles, 'link:withdraw')}
      />
    </>
  )
}
