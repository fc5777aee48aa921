import type { Metadata, Route } from 'next'
import { LocalTime } from '@/components/desk/local-time'
import { Button } from '@/components/ui/button'
import { ButtonLink } from '@/components/ui/button-link'
import { EmptyState } from '@/components/ui/empty-state'
import { Field } from '@/components/ui/field'
import { Select } from '@/components/ui/select'
import type { AuditQuery } from '@/lib/contracts/member'
import { auditQuerySchema } from '@/lib/contracts/member'
import { pageActor } from '@/lib/server/auth/page-actor'
import { pageAnswer } from '@/lib/server/auth/page-answer'
import { readAuditFilters, readAuditTrail } from '@/lib/server/party/read-audit-trail'

export const metadata: Metadata = { title: 'Audit trail' }

type Query = Promise<Record<string, string | string[] | undefined>>

/** What of the address can be used; a part that is empty or makes no sense is as if it were not there. */
function readQuery(raw: Awaited<Query>): AuditQuery {
  const query: AuditQuery = {}
  for (const key of ['before', 'person', 'action'] as const) {
    const parsed = auditQuerySchema.safeParse({ [key]: raw[key] || undefined })
    if (parsed.success) Object.assign(query, parsed.data)
  }
  return query
}

function address(query: AuditQuery): Route {
  const given = new URLSearchParams()
  for (const [key, value] of Object.entries(query)) if (value !== undefined) given.set(key, String(value))
  return `/party/audit${given.size > 0 ? `?${given}` : ''}` as Route
}

export default async function AuditPage({ searchParams }: { searchParams: Query }) {
  const actor = await pageActor()
  const query = readQuery(await searchParams)
  const [trail, filters] = await pageAnswer(Promise.all([readAuditTrail(actor, query), readAuditFilters(actor)]))
  return (
    <>
      <h1 className="text-4xl">Audit trail</h1>
      <p className="mt-1 text-soft">Who did what in this party, newest first.</p>
      <form method="get" className="mt-5 flex flex-wrap items-end gap-3">
        <Field label="Person" className="grow basis-48 sm:max-w-64">
          {(control) => (
            <Select {...control} name="person" defaultValue={query.person ?? ''} placeholder="Everybody" options={filters.people} />
          )}
        </Field>
        <Field label="Action" className="grow basis-48 sm:max-w-64">
          {(control) => (
            <Select {...control} name="action" defaultValue={query.action ?? ''} placeholder="Everything" options={filters.actions} />
          )}
        </Field>
        <Button type="submit">Show these</Button>
      </form>
      {trail.lines.length === 0 ? (
        <div className="mt-6">
          <EmptyState
            title="Nothing here"
            action={<ButtonLink href={'/party/audit' as Route}>Show everything</ButtonLink>}
          >
            Nobody did such a thing, or not so long ago.
          </EmptyState>
        </div>
      ) : (
        <ol className="mt-6 border-t-2 border-ink">
          {trail.lines.map((line) => (
            <li key={line.id} className="flex flex-wrap gap-x-6 border-b border-line py-2">
              <p className="min-w-0 grow basis-80 wrap-anywhere">
                <strong>{line.who}</strong> {line.sentence}
              </p>
              <p className="text-sm text-soft">
                <LocalTime iso={line.at} />
                {line.address && <span className="figures ml-3">{line.address}</span>}
              </p>
            </li>
          ))}
        </ol>
      )}
      <div className="mt-4 flex flex-wrap gap-3">
        {query.before && <ButtonLink href={address({ ...query, before: undefined })}>Newest</ButtonLink>}
        {trail.older && <ButtonLink href={address({ ...query, before: trail.older })}>Older</ButtonLink>}
      </div>
    </>
  )
}
