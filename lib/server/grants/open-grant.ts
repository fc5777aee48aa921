import { randomUUID } from 'node:crypto'
import type { Db } from '@/db/client'
import { findOpenGrant, insertGrant, insertGrantToken, lockGrants, renewGrant } from '@/db/queries/grant'
import type { MemberActor } from '@/lib/server/auth/actor'
import { hashToken, linkToken } from '@/lib/server/auth/link-token'

export type GrantFor = {
  purpose: 'reply' | 'bench'
  showId: string | null
  hireId: string | null
  /** The contact it is for; null for a bench code for whoever stands there. */
  contactId: string | null
  recipientName: string
  recipientEmail: string | null
  expiresAt: Date
}

/** Leave to answer or to tune, made once for one contact and show or hire and used again at each sending, with a later end if need be. */
export async function openGrant(tx: Db, actor: MemberActor, input: GrantFor): Promise<string> {
  await lockGrants(tx, actor, input.showId ?? input.hireId ?? '')
  const found = await findOpenGrant(tx, actor, input)
  if (!found) return insertGrant(tx, actor, { ...input, createdBy: actor.personId })
  await renewGrant(tx, actor, {
    grantId: found.id,
    recipientName: input.recipientName,
    recipientEmail: input.recipientEmail,
    expiresAt: found.expiresAt > input.expiresAt ? found.expiresAt : input.expiresAt,
  })
  return found.id
}

/** Makes another key to a grant. The key itself is never stored: it is made again from its id where it is needed. */
export async function makeGrantToken(tx: Db, scope: { partyId: string }, grantId: string, madeFor: 'dispatch' | 'print' | 'fresh'): Promise<string> {
  const id = randomUUID()
  await insertGrantToken(tx, scope, { id, grantId, madeFor, tokenHash: hashToken(linkToken('grant', id)) })
  return id
}
