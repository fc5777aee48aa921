import type { Metadata, Route } from 'next'
import { notFound } from 'next/navigation'
import { KitList } from '@/components/kit/kit-list'
import { NotePlanner } from '@/components/kit/notes/note-planner'
import { ToursGauge } from '@/components/kit/tours-gauge'
import { EmptyState } from '@/components/ui/empty-state'
import { NavLinks } from '@/components/ui/nav-links'
import { noteLocale } from '@/lib/advance/note-locale'
import { RefreshOnLive } from '@/lib/client/live-provider'
import { idSchema } from '@/lib/contracts/common'
import { rolesMay } from '@/lib/contracts/permissions'
import { pageActor } from '@/lib/server/auth/page-actor'
import { pageAnswer } from '@/lib/server/auth/page-answer'
import { readToursGauge } from '@/lib/server/gauges/read-gauges'
import { readKitPage } from '@/lib/server/kit/read-kit'
import { readNoteTemplates } from '@/lib/server/note-templates/note-templates'

export const metadata: Metadata = { title: 'Kit' }

type Props = {
  params: Promise<{ tourId: string }>
  searchParams: Promise<Record<string, string | string[] | undefined>>
}

/** The kit of one of the tour's rigs, and the plan of its notes. Rig and view stand in the address. */
export default async function KitPage({ params, searchParams }: Props) {
  const actor = await pageActor()
  const tourId = idSchema.safeParse((await params).tourId)
  const query = await searchParams
  const rigId = idSchema.optional().safeParse(query['rig'])
  if (!tourId.success || !rigId.success) notFound()
  const view = query['view'] === 'notes' ? 'notes' : 'kit'
  const { tour, rig } = await pageAnswer(readKitPage(actor, { tourId: tourId.data, rigId: rigId.data }))
  const mayEdit = rolesMay(actor.roles, 'kit:edit')

  if (!rig) {
    return (
      <main id="main" className="mx-auto max-w-7xl px-4 pt-6 pb-16 sm:px-6">
        <h1 className="text-4xl">Kit</h1>
        <div className="mt-6">
          <EmptyState title="This tour has no rig yet">
            A kit belongs to a rig: full, fly, acoustic. Add the first rig on the tour’s own page, then come back here.
          </EmptyState>
        </div>
      </main>
    )
  }
  const href = (to: 'kit' | 'notes') =>
    `/tours/${tour.id}/kit?rig=${rig.id}${to === 'notes' ? '&view=notes' : ''}` as Route
  const reader = { ...rig.reader, locale: noteLocale(rig.reader.locale) }
  const [gauge, templates] = await Promise.all([
    pageAnswer(readToursGauge(actor)),
    view === 'notes' ? readNoteTemplates(actor).then((read) => read.templates) : [],
  ])
  const shared = { rigId: rig.id, initial: rig.entries, reader, mayEdit }
  return (
    <main id="main" className="mx-auto max-w-7xl px-4 pt-6 pb-24 sm:px-6">
      <div className="flex flex-wrap items-end justify-between gap-x-8 gap-y-1">
        <h1 className="text-4xl">
          {view === 'kit' ? 'Kit' : 'Notes'} <span className="text-soft">{rig.name}</span>
        </h1>
        <NavLinks
          label="This kit"
          links={[
            { href: href('kit'), label: 'Kit', current: view === 'kit' },
            { href: href('notes'), label: 'Notes', current: view === 'notes' },
          ]}
        />
      </div>
      <RefreshOnLive topics={[`gauge:${actor.partyId}`]} />
      <ToursGauge gauge={gauge}>
        {view === 'kit' ? (
          <KitList key={rig.id} {...shared} sources={rig.sources} />
        ) : (
          <NotePlanner key={rig.id} {...shared} {...{ templates, partyId: actor.partyId, kitHref: href('kit') }} />
        )}
      </ToursGauge>
    </main>
  )
}
