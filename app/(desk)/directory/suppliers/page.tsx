import type { Metadata, Route } from 'next'
import Link from 'next/link'
import { AddSupplier } from '@/components/directory/add-supplier'
import { ListTools } from '@/components/list/list-tools'
import { Pages } from '@/components/list/pages'
import { SortHead } from '@/components/list/sort-head'
import { EmptyState } from '@/components/ui/empty-state'
import { Table, TableCell, TableHead, TableRow } from '@/components/ui/table'
import { supplierListQuery } from '@/lib/contracts/directory'
import { rolesMay } from '@/lib/contracts/permissions'
import { pageActor } from '@/lib/server/auth/page-actor'
import { pageAnswer } from '@/lib/server/auth/page-answer'
import { readSuppliers } from '@/lib/server/directory/suppliers'

export const metadata: Metadata = { title: 'Suppliers' }

const path = '/directory/suppliers'
const filters = [
  { value: 'all', label: 'every supplier' },
  { value: 'no-currency', label: 'without a currency' },
  { value: 'no-contact', label: 'without a contact' },
]

export default async function SuppliersPage({ searchParams }: PageProps<'/directory/suppliers'>) {
  const actor = await pageActor()
  const query = supplierListQuery.parse(await searchParams)
  const { rows, total } = await pageAnswer(readSuppliers(actor, query))
  const mayEdit = rolesMay(actor.roles, 'directory:edit')
  const nothingYet = total === 0 && query.q === '' && query.filter === 'all'
  return (
    <>
      <h1 className="text-4xl">Suppliers</h1>
      <div className="mt-6 flex flex-col items-start gap-4">
        {nothingYet && (
          <EmptyState title="No supplier yet">
            {mayEdit
              ? 'Add whoever brings rented drums: a name, a currency and the person to write to. A hire is then asked of it for several shows at once.'
              : 'The tour manager adds the suppliers; their contacts and hires then stand here.'}
          </EmptyState>
        )}
        {mayEdit && <AddSupplier first={nothingYet} />}
        {!nothingYet && <ListTools path={path} query={query} searched="Name, town or country" filters={filters} />}
      </div>
      {!nothingYet && rows.length === 0 && (
        <p className="mt-6 text-soft">No supplier is like that. Show all, or look for a part of the name.</p>
      )}
      {rows.length > 0 && (
        <Table
          caption="Suppliers"
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
              <TableHead>Currency</TableHead>
              <TableHead numeric>Hires</TableHead>
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
              <TableCell className="figures">{row.currency ?? ''}</TableCell>
              <TableCell numeric>{row.hires}</TableCell>
              <TableCell numeric>{row.contacts}</TableCell>
            </TableRow>
          ))}
        </Table>
      )}
      {!nothingYet && <Pages path={path} query={query} total={total} words={['supplier', 'suppliers']} />}
    </>
  )
}
