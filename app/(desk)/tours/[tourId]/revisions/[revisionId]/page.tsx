import type { Metadata, Route } from 'next'
import { notFound } from 'next/navigation'
import { AskedLines } from '@/components/pack/asked-lines'
import { ChangeList } from '@/components/pack/change-list'
import { PreviewPacks } from '@/components/pack/preview-packs'
import type { PackReader } from '@/components/pack/preview-packs'
import { ButtonLink } from '@/components/ui/button-link'
import { instantWords } from '@/lib/advance/when-words'
import { idSchema } from '@/lib/contracts/common'
import { rolesMay } from '@/lib/contracts/permissions'
import { pageActor } from '@/lib/server/auth/page-actor'
import { pageAnswer } from '@/lib/server/auth/page-answer'
import { readRevision } from '@/lib/server/revisions/read-revision'
import type { Run } from '@/lib/server/tours/read-run'
import { dateWords } from '@/lib/staging/calendar'
import { pageRun } from '../../page-run'

export const metadata: Metadata = { title: 'Revision' }

/** One revision as it was issued: what changed, what it asks, and what each of its readers would get. */
export default async function RevisionPage({ params }: PageProps<'/tours/[tourId]/revisions/[revisionId]'>) {
  const actor = await pageActor()
  const { tourId, revisionId } = await params
  if (!idSchema.safeParse(revisionId).success) notFound()
  const run = await pageRun(tourId)
  const revision = await pageAnswer(readRevision(actor, { revisionId }))
  if (revision.tourId !== tourId) notFound()
  const readers = readersOf(run, revision.rigId)
  return (
    <main id="main" className="mx-auto max-w-7xl px-4 pt-6 pb-16 sm:px-6">
      <div className="mb-6 flex flex-wrap items-end justify-between gap-x-8 gap-y-2">
        <div>
          <h1 className="text-4xl">
            Revision {revision.number} <span className="text-soft">{revision.rigName}</span>
          </h1>
          <p className="mt-1 max-w-prose whitespace-pre-line">{revision.note}</p>
          <p className="mt-1 text-sm text-soft">
            Issued by {revision.issuedBy.name}, <span className="figures">{instantWords(revision.issuedAt, null)}</span>
            . {revision.pieces === 1 ? '1 piece' : `${revision.pieces} pieces`} on the plot,{' '}
            {revision.channels === 1 ? '1 channel' : `${revision.channels} channels`}. It never changes.
          </p>
        </div>
        <ButtonLink href={`/tours/${tourId}/revisions?rig=${revision.rigId}` as Route}>
          All revisions of {revision.rigName}
        </ButtonLink>
      </div>
      <div className="flex flex-col gap-10">
        {revision.changes && (
          <section aria-labelledby="changed">
            <h2 id="changed" className="mb-3 text-2xl">
              Changed since revision {revision.previousNumber}
            </h2>
            <ChangeList changes={revision.changes} />
          </section>
        )}
        <section aria-labelledby="lines">
          <h2 id="lines" className="mb-3 text-2xl">
            {revision.lines === 1 ? '1 line' : `${revision.lines} lines`}
          </h2>
          {revision.asked.length > 0 && (
            <AskedLines
              caption="What the revision asks"
              lines={revision.asked.map((line) => ({
                ...line,
                number: line.position,
                by: line.supply === 'rented' ? 'a supplier' : 'the venue',
              }))}
            />
          )}
          {revision.carried.length > 0 && (
            <p className="mt-3 text-soft">Carried, so not asked for: {revision.carried.join(', ')}.</p>
          )}
        </section>
        <section aria-labelledby="readers">
          <h2 id="readers" className="mb-3 text-2xl">
            Who gets what
          </h2>
          {readers.length === 0 ? (
            <p className="text-soft">No show of this tour plays {revision.rigName} yet.</p>
          ) : rolesMay(actor.roles, 'pack:preview') ? (
            <PreviewPacks tourId={tourId} rigId={revision.rigId} revisionId={revision.id} readers={readers} />
          ) : (
            <ul className="list-none">
              {readers.map(({ name, detail }) => (
                <li key={`${name} ${detail}`}>
                  {name} <span className="text-soft">{detail}</span>
                </li>
              ))}
            </ul>
          )}
        </section>
      </div>
    </main>
  )
}

function readersOf(run: Run, rigId: string): PackReader[] {
  const shows = run.days.flatMap((day) => day.shows).filter((show) => show.rigId === rigId)
  const ids = new Set(shows.map((show) => show.id))
  return [
    ...shows.map((show): PackReader => ({
      of: { showId: show.id },
      name: show.venueName,
      detail: [show.name, dateWords(show.date), show.town].filter(Boolean).join(', '),
    })),
    ...run.hires.flatMap((hire): PackReader[] => {
      const covered = hire.showIds.filter((id) => ids.has(id)).length
      if (covered === 0) return []
      return [
        {
          of: { hireId: hire.id },
          name: hire.supplierName,
          detail: `hire over ${covered === 1 ? '1 show' : `${covered} shows`}`,
        },
      ]
    }),
  ]
}
