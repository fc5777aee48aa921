import type { Metadata } from 'next'
import { Hires } from '@/components/run/hires'
import { NextSteps } from '@/components/run/next-steps'
import { Rigs } from '@/components/run/rigs'
import { RunDays } from '@/components/run/run-days'
import { TourHeading } from '@/components/run/tour-heading'
import { ListTools } from '@/components/list/list-tools'
import { Pages } from '@/components/list/pages'
import { RefreshOnLive } from '@/lib/client/live-provider'
import { rolesMay } from '@/lib/contracts/permissions'
import type { Permission } from '@/lib/contracts/permissions'
import { dayKinds, dayKindWords, runListQuery } from '@/lib/contracts/tour'
import { pageActor } from '@/lib/server/auth/page-actor'
import { pageAnswer } from '@/lib/server/auth/page-answer'
import { readNextUp } from '@/lib/server/tours/read-run'
import { dateAfter, dateWords } from '@/lib/staging/calendar'
import { pageRun } from '../page-run'
import { runChoices } from './run-choices'
import { findDays } from './find-days'
import { nextLinks } from './next-links'

export const metadata: Metadata = { title: 'Run' }

/** Two months of days to a page. */
const daysShown = 62

const filters = [
  { value: 'all', label: 'every day' },
  ...dayKinds.map((kind) => ({ value: kind, label: kind === 'show' ? 'show days' : dayKindWords[kind] })),
  { value: 'no-zone', label: 'shows whose zone is not known' },
]

export default async function RunPage({ params, searchParams }: PageProps<'/tours/[tourId]/run'>) {
  const { tourId } = await params
  const query = runListQuery.parse(await searchParams)
  const actor = await pageActor()
  const run = await pageRun(tourId)
  const [steps, choices] = await pageAnswer(Promise.all([readNextUp(actor, run), runChoices(actor, run)]))
  const may = (permission: Permission) => rolesMay(actor.roles, permission)
  const path = `/tours/${tourId}/run`
  const found = findDays(run.days, query)
  const last = run.days.at(-1)?.date
  const firstFree = last ? dateAfter(last, 1) : new Date().toISOString().slice(0, 10)
  const shows = run.days.flatMap((day) => day.shows)
  return (
    <main id="main" className="mx-auto max-w-7xl px-4 py-6 sm:px-6">
      <RefreshOnLive
        topics={[...shows, ...run.hires].map(({ id }) => `advance:${id}`).concat(`directory:${actor.partyId}`)}
      />
      <TourHeading tour={run.tour} mayEdit={may('tour:edit')} />
      <div className="mt-6 grid items-start gap-x-12 gap-y-10 lg:grid-cols-[minmax(0,5fr)_minmax(0,3fr)]">
        <section aria-labelledby="next" className="lg:order-last">
          <h2 id="next" className="text-2xl">
            Next
          </h2>
          <NextSteps steps={nextLinks(run, steps)} />
        </section>
        <section aria-labelledby="days" className="min-w-0">
          <h2 id="days" className="text-2xl">
            Days and shows
          </h2>
          {run.days.length > 0 && (
            <div className="mt-3">
              <ListTools path={path} query={query} searched="Venue, town or remark" filters={filters} />
            </div>
          )}
          <RunDays
            tourId={tourId}
            days={found.slice((query.page - 1) * daysShown, query.page * daysShown)}
            nothingYet={run.days.length === 0}
            firstFree={firstFree}
            choices={choices.show}
            may={{ editDays: may('tour:edit'), editShows: may('show:edit') }}
          />
          {run.days.length > 0 && (
            <Pages path={path} query={query} total={found.length} words={['day', 'days']} size={daysShown} />
          )}
        </section>
      </div>
      <section aria-labelledby="hires" className="mt-12">
        <h2 id="hires" className="text-2xl">
          Hires
        </h2>
        <Hires
          tourId={tourId}
          hires={run.hires.map((hire) => ({
            hire,
            standing: hire.standing?.standing ?? null,
            shows: shows
              .filter((show) => hire.showIds.includes(show.id))
              .map((show) => ({
                id: show.id,
                label: `${dateWords(show.date)}, ${show.venueName}`,
              })),
          }))}
          choices={choices.hire}
          mayEdit={may('hire:edit')}
        />
      </section>
      <section aria-labelledby="rigs" className="mt-12">
        <h2 id="rigs" className="text-2xl">
          Rigs
        </h2>
        <Rigs
          tourId={tourId}
          rigs={run.rigs.map((rig) => ({ rig, shows: shows.filter((show) => show.rigId === rig.id).length }))}
          mayEdit={may('rig:edit')}
        />
      </section>
    </main>
  )
}
