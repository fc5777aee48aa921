import type { Metadata, Route } from 'next'
import Link from 'next/link'
import { AddVenue } from '@/components/directory/add-venue'
import { ListTools } from '@/components/list/list-tools'
import { Pages } from '@/components/list/pages'
import { SortHead } from '@/components/list/sort-head'
import { EmptyState } from '@/components/ui/empty-state'
import { Table, TableCell, TableHead, TableRow } from '@/components/ui/table'
import { venueListQuery } from '@/lib/contracts/directory'
import { rolesMay } from '@/lib/contracts/permissions'
import { pageActor } from '@/lib/server/auth/page-actor'
import { pageAnswer } from '@/lib/server/auth/page-answer'
import { readVenues } from '@/lib/server/directory/venues'

export const metadata: Metadata = { title: 'Venues' }

const path = '/directory/venues'
const filters = [
  { value: 'all', label: 'every venue' },
  { value: 'no-zone', label: 'zone not known yet' },
  { value: 'no-stage', label: 'without a stage' },
  { value: 'no-contact', label: 'without a contact' },
]

export default async function VenuesPage({ searchParams }: PageProps<'/directory/venues'>) {
  const actor = await pageActor()
  const query = venueListQuery.parse(await searchParams)
  const { rows, total } = await pageAnswer(readVenues(actor, query))
  const mayEdit = rolesMay(actor.roles, 'directory:edit')
  const nothingYet = total === 0 && query.q === '' && query.filter === 'all'
  return (
    <>
      <h1 className="text-4xl">Venues</h1>
      <div className="mt-6 flex flex-col items-start gap-4">
        {nothingYet && (
          <EmptyState title="No venue yet">
            {mayEdit
              ? 'Begin with the first venue of the run: its name, its town and its time zone. Then its stage and whoever looks after backline there.'
              : 'The tour manager adds the venues; their stages and contacts then stand here.'}
          </EmptyState>
        )}
        {mayEdit && <AddVenue first={nothingYet} />}
        {!nothingYet && <ListTools path={path} query={query} searched="Name, town or country" filters={filters} />}
      </div>
      {!nothingYet && rows.length === 0 && (
        <p className="mt-6 text-soft">No venue is like that. Show all, or look for a part of the name.</p>
      )}
      {rows.length > 0 && (
        <Table
          caption="Venues"
          captionHidden
          className="mt-4"
          head={
            <>
              <SortHead path={path} query={query} by="name">
                Name
              </SortHead>
              <SortHead path={path} query={query} by="town">
                Town
              </SortHead>
              <SortHead path={path} query={query} by="country">
                Country
              </SortHead>
              <TableHead>Time zone</TableHead>
              <TableHead numeric>Stages</TableHead>
              <TableHead numeric>Contacts</TableHead>
            </>
          }
        >
          {rows.map((row) => (
            <TableRow key={row.id}>
              <TableCell>
                <Link
                  href={`${path}/${row.id}` as Route}
                  className="name inline-flex min-h-7 items-center text-lg underline-offset-4 hover:underline"
                >
                  {row.name}
                </Link>
              </TableCell>
              <TableCell>{row.town}</TableCell>
              <TableCell>{row.country}</TableCell>
              <TableCell>{row.zone ?? <span className="font-bold text-brass">not known yet</span>}</TableCell>
              <TableCell numeric>{row.stages}</TableCell>
              <TableCell numeric>{row.contacts}</TableCell>
            </TableRow>
          ))}
        </Table>
      )}
      {!nothingYet && <Pages path={path} query={query} total={total} words={['venue', 'venues']} />}
    </>
  )
}
