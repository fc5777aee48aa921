import type { Metadata } from 'next'
import { notFound } from 'next/navigation'
import { EmptyState } from '@/components/ui/empty-state'
import { idSchema } from '@/lib/contracts/common'
import { rolesMay } from '@/lib/contracts/permissions'
import { pageActor } from '@/lib/server/auth/page-actor'
import { pageAnswer } from '@/lib/server/auth/page-answer'
import { readPlotPage } from '@/lib/server/plots/read-plot-page'
import { PlotDesk } from '@/plots/index'

export const metadata: Metadata = { title: 'Plot' }

type Props = {
  params: Promise<{ tourId: string }>
  searchParams: Promise<Record<string, string | string[] | undefined>>
}

/** The plot of one of the tour's rigs; the rig stands in the address. */
export default async function PlotPage({ params, searchParams }: Props) {
  const actor = await pageActor()
  const tourId = idSchema.safeParse((await params).tourId)
  const rigId = idSchema.optional().safeParse((await searchParams)['rig'])
  if (!tourId.success || !rigId.success) notFound()
  const { rig } = await pageAnswer(readPlotPage(actor, { tourId: tourId.data, rigId: rigId.data }))
  if (!rig) {
    return (
      <main id="main" className="mx-auto max-w-7xl px-4 pt-6 pb-16 sm:px-6">
        <h1 className="text-4xl">Plot</h1>
        <div className="mt-6">
          <EmptyState title="This tour has no rig yet">
            A plot belongs to a rig: full, fly, acoustic. Add the first rig on the tour’s own page, then come back here.
          </EmptyState>
        </div>
      </main>
    )
  }
  return (
    <main id="main" className="px-4 pt-4 pb-8 sm:px-6">
      <h1 className="mb-3 text-3xl">
        Plot <span className="text-soft">{rig.name}</span>
      </h1>
      <PlotDesk
        key={rig.id}
        plot={rig.plot}
        entries={rig.entries}
        channels={rig.channels}
        reader={rig.reader}
        personId={actor.personId}
        mayEdit={rolesMay(actor.roles, 'plot:edit')}
        mayPatch={rolesMay(actor.roles, 'patch:edit')}
      />
    </main>
  )
}
