import type { z } from 'zod'
import { db } from '@/db/client'
import { listAuditActions, listAuditEvents, listAuditNames } from '@/db/queries/audit'
import { listMembers } from '@/db/queries/member'
import { idSchema } from '@/lib/contracts/common'
import type { auditPageSchema, AuditQuery } from '@/lib/contracts/member'
import type { Actor } from '@/lib/server/auth/actor'
import { assertCan } from '@/lib/server/auth/actor'
import { actionWords, auditSentence } from './audit-sentence'
import { keptIds } from './told'

const pageLines = 50

type Row = Awaited<ReturnType<typeof listAuditEvents>>[number]

function who(row: Row): string {
  switch (row.actorKind) {
    case 'person':
      return row.personName ?? 'Somebody who has left'
    case 'link':
      return `${row.recipientName ?? 'Somebody'}, by a link`
    case 'job':
      return 'Hoopwright'
    case 'public':
      return 'Somebody not signed in'
  }
}

/** Who did what in the party, newest first. */
export async function readAuditTrail(actor: Actor, query: AuditQuery): Promise<z.input<typeof auditPageSchema>> {
  assertCan(actor, 'audit:read')
  const rows = await listAuditEvents(db(), actor, { ...query, limit: pageLines + 1 })
  const shown = rows.slice(0, pageLines)
  const names = await listAuditNames(
    db(),
    actor,
    shown.flatMap((row) => [row.subjectId, ...keptIds(row.detail)]).filter((id) => idSchema.safeParse(id).success),
  )
  return {
    lines: shown.map((row) => ({
      id: row.id,
      at: row.at.toISOString(),
      who: who(row),
      sentence: auditSentence(row.action, row.detail, row.subjectId, names),
      address: row.address,
    })),
    older: rows.length > pageLines ? (shown.at(-1)?.id ?? null) : null,
  }
}

/** What the trail can be narrowed to. */
export async function readAuditFilters(actor: Actor) {
  assertCan(actor, 'audit:read')
  const [people, actions] = await Promise.all([listMembers(db(), actor), listAuditActions(db(), actor)])
  return {
    people: people.map((row) => ({ value: row.personId, label: row.name })),
    actions: actions.map((action) => ({ value: action, label: actionWords(action) })),
  }
}
