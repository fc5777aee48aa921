import type { Metadata, Route } from 'next'
import { notFound } from 'next/navigation'
import { PackView } from '@/components/pack/pack-view'
import { PdfState } from '@/components/pack/pdf-state'
import { ButtonLink } from '@/components/ui/button-link'
import { RefreshOnLive } from '@/lib/client/live-provider'
import { idSchema } from '@/lib/contracts/common'
import { pageActor } from '@/lib/server/auth/page-actor'
import { pageAnswer } from '@/lib/server/auth/page-answer'
import { readPack } from '@/lib/server/packs/read-pack'

export const metadata: Metadata = { title: 'Pack' }

/** A pack as its reader would get it, and its PDF as soon as it is there. */
export default async function PackPage({ params }: PageProps<'/tours/[tourId]/revisions/packs/[packId]'>) {
  const actor = await pageActor()
  const { tourId, packId } = await params
  if (!idSchema.safeParse(packId).success) notFound()
  const { state, document, rigId, tourId: packTourId } = await pageAnswer(readPack(actor, { packId }))
  if (packTourId !== tourId) notFound()
  return (
    <main id="main" className="mx-auto max-w-7xl px-4 pt-6 pb-16 sm:px-6">
      {state.pdf === 'making' && <RefreshOnLive topics={[`revision:${rigId}`]} />}
      <div className="mb-4 flex flex-wrap items-end justify-between gap-x-8 gap-y-2">
        <div>
          <h1 className="text-4xl">
            Pack <span className="text-soft">for {document.recipient.name}</span>
          </h1>
          <p className="mt-1">
            Revision {document.revision.number}, {document.rig}: {document.revision.note}
          </p>
        </div>
        <ButtonLink href={`/tours/${tourId}/revisions/${state.revisionId}` as Route}>
          Revision {state.revisionNumber} and its other readers
        </ButtonLink>
      </div>
      <div className="mb-10">
        <PdfState state={state} />
      </div>
      <PackView pack={document} />
    </main>
  )
}
