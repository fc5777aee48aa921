import type { Metadata, Route } from 'next'
import Link from 'next/link'
import { ListTools } from '@/components/list/list-tools'
import { Pages } from '@/components/list/pages'
import { SortHead } from '@/components/list/sort-head'
import { AddTour } from '@/components/run/add-tour'
import { ButtonLink } from '@/components/ui/button-link'
import { EmptyState } from '@/components/ui/empty-state'
import { Table, TableCell, TableHead, TableRow } from '@/components/ui/table'
import { RefreshOnLive } from '@/lib/client/live-provider'
import { rolesMay } from '@/lib/contracts/permissions'
import { tourListQuery } from '@/lib/contracts/tour'
import { pageActor } from '@/lib/server/auth/page-actor'
import { pageAnswer } from '@/lib/server/auth/page-answer'
import { readPlayerNames } from '@/lib/server/players/players'
import { readTours } from '@/lib/server/tours/tours'
import { dateWords } from '@/lib/staging/calendar'

export const metadata: Metadata = { title: 'Tours' }

const filters = [
  { value: 'all', label: 'every tour' },
  { value: 'ahead', label: 'still running or ahead' },
  { value: 'over', label: 'over' },
]

export default async function ToursPage({ searchParams }: PageProps<'/tours'>) {
  const actor = await pageActor()
  const query = tourListQuery.parse(await searchParams)
  const [{ rows, total }, players] = await pageAnswer(Promise.all([readTours(actor, query), readPlayerNames(actor)]))
  const mayEdit = rolesMay(actor.roles, 'tour:edit')
  const nothingYet = total === 0 && query.q === '' && query.filter === 'all'
  return (
    <main id="main" className="mx-auto max-w-5xl px-4 py-8 sm:px-6">
      <RefreshOnLive topics={[`party:${actor.partyId}`]} />
      <h1 className="text-4xl">Tours</h1>
      {nothingYet ? (
        <div className="mt-6 max-w-3xl">
          <EmptyState
            title="No tour yet"
            action={
              !mayEdit && rolesMay(actor.roles, 'member:manage') ? (
                <ButtonLink href="/party">Invite the party or take a role yourself</ButtonLink>
              ) : undefined
            }
          >
            {mayEdit
              ? 'Begin with its name, its first rig and its dates. The kit, the plot and every venue then hang on the days of its run.'
              : 'The tour manager makes the first tour; its kit, plot and run then stand here.'}
          </EmptyState>
          {mayEdit && (
            <div className="mt-6">
              <AddTour asksPlayer={players.length === 0} open />
            </div>
          )}
        </div>
      ) : (
        <>
          <div className="mt-6 flex flex-col items-start gap-4">
            {mayEdit && <AddTour asksPlayer={players.length === 0} open={false} />}
            <ListTools path="/tours" query={query} searched="Name" filters={filters} />
          </div>
          {rows.length === 0 ? (
            <p className="mt-6 text-soft">No tour is like that. Show all, or look for a part of the name.</p>
          ) : (
            <Table
              caption="Tours"
              captionHidden
              className="mt-4"
              head={
                <>
                  <SortHead path="/tours" query={query} by="name">
                    Name
                  </SortHead>
                  <SortHead path="/tours" query={query} by="first">
                    Dates
                  </SortHead>
                  <TableHead numeric>Days</TableHead>
                  <TableHead numeric>Shows</TableHead>
                </>
              }
            >
              {rows.map((tour) => (
                <TableRow key={tour.id}>
                  <TableCell>
                    <Link
                      href={`/tours/${tour.id}/run` as Route}
                      className="name inline-flex min-h-7 items-center text-lg underline-offset-4 hover:underline"
                    >
                      {tour.name}
                    </Link>
                  </TableCell>
                  <TableCell className="whitespace-nowrap">
                    {tour.first && tour.last
                      ? `${dateWords(tour.first)} to ${dateWords(tour.last)} ${tour.last.slice(0, 4)}`
                      : 'no days yet'}
                  </TableCell>
                  <TableCell numeric>{tour.days}</TableCell>
                  <TableCell numeric>{tour.shows}</TableCell>
                </TableRow>
              ))}
            </Table>
          )}
          <Pages path="/tours" query={query} total={total} words={['tour', 'tours']} />
        </>
      )}
    </main>
  )
}
