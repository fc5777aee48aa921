import type { Metadata, Route } from 'next'
import { notFound } from 'next/navigation'
import { ChangeList } from '@/components/pack/change-list'
import { IssueRevisionForm } from '@/components/pack/issue-revision-form'
import { RevisionTable } from '@/components/pack/revision-table'
import { ButtonLink } from '@/components/ui/button-link'
import { EmptyState } from '@/components/ui/empty-state'
import { RefreshOnLive } from '@/lib/client/live-provider'
import { idSchema } from '@/lib/contracts/common'
import { rolesMay } from '@/lib/contracts/permissions'
import type { RevisionPreview } from '@/lib/contracts/revision'
import { pageActor } from '@/lib/server/auth/page-actor'
import { pageAnswer } from '@/lib/server/auth/page-answer'
import { previewRevision } from '@/lib/server/revisions/preview-revision'

export const metadata: Metadata = { title: 'Revisions' }

/** The revisions of one of the tour's rigs, and what the next one would change; the rig stands in the address. */
export default async function RevisionsPage({ params, searchParams }: PageProps<'/tours/[tourId]/revisions'>) {
  const actor = await pageActor()
  const tourId = idSchema.safeParse((await params).tourId)
  const rigId = idSchema.optional().safeParse((await searchParams)['rig'])
  if (!tourId.success || !rigId.success) notFound()
  const found = await pageAnswer(previewRevision(actor, { tourId: tourId.data, rigId: rigId.data }))
  if (!found) {
    return (
      <main id="main" className="mx-auto max-w-7xl px-4 pt-6 pb-16 sm:px-6">
        <h1 className="mb-6 text-4xl">Revisions</h1>
        <EmptyState
          title="This tour has no rig yet"
          action={<ButtonLink href={`/tours/${tourId.data}/run` as Route}>Add the first rig</ButtonLink>}
        >
          A revision freezes a rig: full, fly, acoustic. Add one on the run, then fill its kit.
        </EmptyState>
      </main>
    )
  }
  const { next, revisions } = found
  return (
    <main id="main" className="mx-auto max-w-7xl px-4 pt-6 pb-16 sm:px-6">
      <RefreshOnLive
        topics={[
          ...[`revision:${next.rigId}`, `kit:${next.rigId}`, `plot:${next.rigId}`, `patch:${next.rigId}`],
          `gauge:${actor.partyId}`,
        ]}
      />
      <h1 className="mb-6 text-4xl">
        Revisions <span className="text-soft">{next.rigName}</span>
      </h1>
      <section aria-labelledby="next" className="mb-10">
        <h2 id="next" className="mb-3 text-2xl">
          {next.state === 'same'
            ? `Nothing changed since revision ${next.number - 1}`
            : `Revision ${next.number} would be`}
        </h2>
        <NextRevision tourId={tourId.data} next={next} mayIssue={rolesMay(actor.roles, 'revision:issue')} />
      </section>
      <section aria-labelledby="issued">
        <h2 id="issued" className="mb-3 text-2xl">
          Issued
        </h2>
        {revisions.length === 0 ? (
          <p className="text-soft">None yet. Packs can be sent once revision 1 is issued.</p>
        ) : (
          <RevisionTable tourId={tourId.data} revisions={revisions} />
        )}
      </section>
    </main>
  )
}

function NextRevision({ tourId, next, mayIssue }: { tourId: string; next: RevisionPreview; mayIssue: boolean }) {
  if (next.state === 'empty') {
    return (
      <EmptyState
        title={`The kit of ${next.rigName} is empty`}
        action={<ButtonLink href={`/tours/${tourId}/kit?rig=${next.rigId}` as Route}>Add the first drum</ButtonLink>}
      >
        A revision freezes the kit, its plot and its patch. There is nothing to freeze yet.
      </EmptyState>
    )
  }
  if (next.state === 'same')
    return <p className="text-soft">A new revision can be issued as soon as the kit, the plot or the patch changes.</p>
  const shows = next.shows === 1 ? '1 show' : `${next.shows} shows`
  return (
    <div className="flex flex-col gap-6">
      {next.changes ? (
        <ChangeList changes={next.changes} />
      ) : (
        <p>The first one: {next.lines} lines, the plot and the patch as they stand now.</p>
      )}
      {mayIssue ? (
        <IssueRevisionForm
          key={next.number}
          tourId={tourId}
          rigId={next.rigId}
          number={next.number}
          action={`Issue revision ${next.number}, ${next.rigName}, ${shows}`}
        />
      ) : (
        <p className="text-soft">A drum tech issues revisions.</p>
      )}
    </div>
  )
}
