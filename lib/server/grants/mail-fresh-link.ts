import { db } from '@/db/client'
import { findRecipient } from '@/db/queries/dispatch'
import { findGrant, findGrantByTokenHash } from '@/db/queries/grant'
import { env } from '@/lib/env'
import { AppError } from '@/lib/errors'
import { audit } from '@/lib/server/audit/audit'
import type { LinkActor } from '@/lib/server/auth/actor'
import { hashToken } from '@/lib/server/auth/link-token'
import type { Limit } from '@/lib/server/http/rate-limit'
import { takeFromLimit } from '@/lib/server/http/rate-limit'
import { letterHtml, letterText } from '@/lib/server/mail/letter'
import { linkPlace } from '@/lib/server/mail/link-place'
import { queueMail } from '@/lib/server/mail/queue-mail'
import { makeGrantToken } from './open-grant'

const perLink: Limit = { name: 'fresh-link', points: 3, seconds: 24 * 60 * 60 }

/**
 * Whoever holds a link that has run out may have a fresh one mailed, to the address we know and to no other: the old link
 * stays run out. The answer never says what that address is.
 */
export async function mailFreshLink(input: { token: string; address: string }): Promise<{ sent: true }> {
  const key = /^[\w-]{43}$/.test(input.token) ? await findGrantByTokenHash(db(), hashToken(input.token)) : undefined
  if (!key) throw new AppError('not-found', 'This link opens nothing. Please check that the whole address was copied.')
  if (key.withdrawnAt) {
    throw new AppError('gone', 'This link was withdrawn. Please ask whoever sent it for a new one.', { details: { reason: 'withdrawn' } })
  }
  if (key.expiresAt.getTime() > Date.now()) throw new AppError('conflict', 'This link still works. Nothing was mailed.')
  await takeFromLimit(perLink, key.grantId)
  const actor: LinkActor = {
    ...{ kind: 'link', purpose: key.purpose, grantId: key.grantId, tokenId: key.tokenId, partyId: key.partyId },
    ...{ showId: key.showId, hireId: key.hireId, recipientName: key.recipientName, address: input.address },
  }
  await db().transaction(async (tx) => {
    const grant = await findGrant(tx, actor, key.grantId)
    const contact = grant?.contactId ? await findRecipient(tx, actor, grant.contactId) : undefined
    if (!grant || !contact) {
      throw new AppError('conflict', 'No address is known for this link. Please ask whoever gave it to you for a new one.')
    }
    const tokenId = await makeGrantToken(tx, actor, grant.id, 'fresh')
    const letter = {
      greeting: `Hello ${contact.name},`,
      paragraphs: ['Here is your fresh link. It opens what you were asked, with everything you have answered so far.', 'If you did not ask for it, you need do nothing.'],
      action: { label: 'Open the lines', href: `${new URL('r/', env().APP_URL).href}${linkPlace('grant', tokenId)}` },
    }
    await queueMail(tx, {
      ...{ partyId: actor.partyId, kind: 'fresh-link', to: { address: contact.email, name: contact.name } },
      ...{ subject: 'Your fresh link', text: letterText(letter), html: letterHtml(letter) },
    })
    await audit(tx, actor, 'link.fresh', { type: 'grant', id: grant.id }, { tokenId })
  })
  return { sent: true }
}
