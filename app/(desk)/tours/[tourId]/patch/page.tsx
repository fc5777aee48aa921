import type { Metadata } from 'next'
import { notFound } from 'next/navigation'
import { ChannelTable } from '@/components/patch/channel-table'
import { EmptyState } from '@/components/ui/empty-state'
import { idSchema } from '@/lib/contracts/common'
import { rolesMay } from '@/lib/contracts/permissions'
import { pageActor } from '@/lib/server/auth/page-actor'
import { pageAnswer } from '@/lib/server/auth/page-answer'
import { readPlotPage } from '@/lib/server/plots/read-plot-page'

export const metadata: Metadata = { title: 'Patch' }

type Props = {
  params: Promise<{ tourId: string }>
  searchParams: Promise<Record<string, string | string[] | undefined>>
}

/** The channel list of one of the tour's rigs; the rig stands in the address. */
export default async function PatchPage({ params, searchParams }: Props) {
  const actor = await pageActor()
  const tourId = idSchema.safeParse((await params).tourId)
  const rigId = idSchema.optional().safeParse((await searchParams)['rig'])
  if (!tourId.success || !rigId.success) notFound()
  const { tour, rig } = await pageAnswer(readPlotPage(actor, { tourId: tourId.data, rigId: rigId.data }))
  return (
    <main id="main" className="mx-auto max-w-7xl px-4 pt-6 pb-16 sm:px-6">
      <h1 className="mb-6 text-4xl">Patch {rig && <span className="text-soft">{rig.name}</span>}</h1>
      {rig ? (
        <ChannelTable
          key={rig.id}
          plot={rig.plot}
          channels={rig.channels}
          entries={rig.entries}
          reader={rig.reader}
          plotHref={`/tours/${tour.id}/plot?rig=${rig.id}`}
          mayEdit={rolesMay(actor.roles, 'patch:edit')}
        />
      ) : (
        <EmptyState title="This tour has no rig yet">
          A patch belongs to a rig: full, fly, acoustic. Add the first rig on the tour’s own page, then come back here.
        </EmptyState>
      )}
    </main>
  )
}
