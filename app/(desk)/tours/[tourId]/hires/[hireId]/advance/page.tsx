import type { Metadata } from 'next'
import { notFound } from 'next/navigation'
import { AdvancePage } from '@/components/advance/advance-page'
import { RefreshOnLive } from '@/lib/client/live-provider'
import { idSchema } from '@/lib/contracts/common'
import { rolesMay } from '@/lib/contracts/permissions'
import { readAdvance } from '@/lib/server/advance/read-advance'
import { pageActor } from '@/lib/server/auth/page-actor'
import { pageAnswer } from '@/lib/server/auth/page-answer'
import { pageRun } from '../../../page-run'

type Props = PageProps<'/tours/[tourId]/hires/[hireId]/advance'>

export async function generateMetadata({ params }: Props): Promise<Metadata> {
  const { tourId, hireId } = await params
  const hire = (await pageRun(tourId)).hires.find(({ id }) => id === hireId)
  return { title: hire ? `Advance, ${hire.supplierName} hire` : 'Advance' }
}

/** The advance of one hire; answers arrive while it is open. */
export default async function HireAdvancePage({ params }: Props) {
  const { tourId, hireId } = await params
  const actor = await pageActor()
  if (!idSchema.safeParse(tourId).success || !idSchema.safeParse(hireId).success) notFound()
  const view = await pageAnswer(readAdvance(actor, { tourId, of: { kind: 'hire', hireId } }))
  return (
    <>
      <RefreshOnLive topics={[`advance:${hireId}`, `directory:${actor.partyId}`]} />
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
