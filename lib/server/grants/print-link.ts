import QRCode from 'qrcode'
import { db } from '@/db/client'
import { listAdvanceShows } from '@/db/queries/dispatch'
import { findGrant } from '@/db/queries/grant'
import type { PrintedLink } from '@/lib/contracts/grant'
import { env } from '@/lib/env'
import { AppError } from '@/lib/errors'
import { audit } from '@/lib/server/audit/audit'
import type { Actor } from '@/lib/server/auth/actor'
import { assertCan } from '@/lib/server/auth/actor'
import { linkToken } from '@/lib/server/auth/link-token'
import { grantExpiry } from './grant-expiry'
import { notifyGrant } from './notify-grant'
import { makeGrantToken, openGrant } from './open-grant'

/** Makes another key to a link and shows it this once, as an address and as a QR code. */
export async function printLink(actor: Actor, input: { grantId: string }): Promise<PrintedLink> {
  assertCan(actor, 'bench:print')
  const made = await db().transaction(async (tx) => {
    const found = await findGrant(tx, actor, input.grantId)
    if (!found) throw new AppError('not-found', 'There is no such link in this party.')
    // A reply link speaks for the recipient; only whoever may send may hand it out.
    if (found.purpose === 'reply') assertCan(actor, 'advance:send')
    if (found.withdrawnAt) throw new AppError('conflict', 'This link was withdrawn. Send the pack again to make a new one.')
    const tokenId = await makeGrantToken(tx, actor, found.id, 'print')
    await audit(tx, actor, 'link.print', { type: 'grant', id: found.id }, { purpose: found.purpose, tokenId })
    await notifyGrant(tx, actor, found)
    return { tokenId, purpose: found.purpose, expiresAt: found.expiresAt }
  })
  return printed(made)
}

/** The bench link of a show, for whoever stands there; made at the first print, another key at each later one. */
export async function printBench(actor: Actor, input: { showId: string }): Promise<PrintedLink> {
  assertCan(actor, 'bench:print')
  const made = await db().transaction(async (tx) => {
    const [show] = await listAdvanceShows(tx, actor, { showId: input.showId })
    if (!show) throw new AppError('not-found', 'There is no such show in this party.')
    const expiresAt = grantExpiry({ lastDate: show.date, zone: show.zone, now: new Date() })
    const grantId = await openGrant(tx, actor, {
      ...{ purpose: 'bench', showId: show.id, hireId: null, contactId: null },
      ...{ recipientName: `Bench at ${show.venueName}`, recipientEmail: null, expiresAt },
    })
    const tokenId = await makeGrantToken(tx, actor, grantId, 'print')
    await audit(tx, actor, 'link.print', { type: 'grant', id: grantId }, { purpose: 'bench', tokenId })
    await notifyGrant(tx, actor, { showId: show.id, hireId: null })
    return { tokenId, purpose: 'bench' as const, expiresAt }
  })
  return printed(made)
}

async function printed(made: { tokenId: string; purpose: 'reply' | 'bench'; expiresAt: Date }): Promise<PrintedLink> {
  const path = `${made.purpose === 'reply' ? 'r' : 'b'}/${linkToken('grant', made.tokenId)}`
  const href = new URL(path, env().APP_URL).href
  return { href, qrSvg: await QRCode.toString(href, { type: 'svg', errorCorrectionLevel: 'M', margin: 4 }), expiresAt: made.expiresAt.toISOString() }
}
