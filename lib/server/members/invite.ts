import { randomUUID } from 'node:crypto'
import type { Db } from '@/db/client'
import { db } from '@/db/client'
import {
  extendInvitation,
  findInvitation,
  insertInvitation,
  listOpenInvitations,
  withdrawInvitation,
  withdrawInvitationsTo,
} from '@/db/queries/invitation'
import { findMember } from '@/db/queries/member'
import { lockParty } from '@/db/queries/party'
import { findPersonByEmail } from '@/db/queries/person'
import type { Role } from '@/lib/contracts/common'
import { roleWords } from '@/lib/contracts/common'
import type { InvitationView, Invite } from '@/lib/contracts/member'
import { env } from '@/lib/env'
import { AppError } from '@/lib/errors'
import { audit } from '@/lib/server/audit/audit'
import type { Actor, MemberActor } from '@/lib/server/auth/actor'
import { assertCan } from '@/lib/server/auth/actor'
import { hashToken, linkToken } from '@/lib/server/auth/link-token'
import type { Limit } from '@/lib/server/http/rate-limit'
import { takeFromLimit } from '@/lib/server/http/rate-limit'
import { notifyLive } from '@/lib/server/live/notify-live'
import type { Letter } from '@/lib/server/mail/letter'
import { letterHtml, letterText } from '@/lib/server/mail/letter'
import { linkPlace } from '@/lib/server/mail/link-place'
import { queueMail } from '@/lib/server/mail/queue-mail'
import { assertMayGive } from './change-member'

const openMs = 14 * 24 * 60 * 60 * 1000
const mailsPerParty: Limit = { name: 'invitation-party', points: 30, seconds: 3600 }
const mailsPerReader: Limit = { name: 'invitation-reader', points: 5, seconds: 3600 }

type Row = NonNullable<Awaited<ReturnType<typeof findInvitation>>>

function asView(row: Row): InvitationView {
  return {
    id: row.id,
    email: row.email,
    roles: row.roles,
    invitedBy: row.invitedBy,
    createdAt: row.createdAt.toISOString(),
    expiresAt: row.expiresAt.toISOString(),
    expired: row.expiresAt.getTime() <= Date.now(),
  }
}

async function mailInvitation(tx: Db, row: Row): Promise<void> {
  const letter: Letter = {
    greeting: 'Hello,',
    paragraphs: [
      `${row.invitedBy} invites you to the touring party ${row.partyName}, as ${row.roles.map((role: Role) => roleWords[role]).join(' and ')}.`,
      'The link shows you the invitation before you join. It is for this mail address and works once, for 14 days.',
    ],
    action: { label: `See the invitation to ${row.partyName}`, href: `${env().APP_URL}/invitation/${linkPlace('invitation', row.id)}` },
    closing: 'If you do not know what this is about, you need do nothing.',
  }
  await queueMail(tx, {
    partyId: row.partyId,
    kind: 'invitation',
    to: { address: row.email, name: '' },
    subject: `${row.invitedBy} invites you to ${row.partyName}`,
    text: letterText(letter),
    html: letterHtml(letter),
  })
}

async function takeFromInvitationLimits(actor: MemberActor, email: string): Promise<void> {
  await takeFromLimit(mailsPerParty, actor.partyId)
  await takeFromLimit(mailsPerReader, email)
}

const notThere = () => new AppError('not-found', 'That invitation is not open any more. Nothing was changed.')

export async function readInvitations(actor: Actor): Promise<InvitationView[]> {
  assertCan(actor, 'member:manage')
  return (await listOpenInvitations(db(), actor)).map(asView)
}

/** Invites an address with roles. One open invitation an address: asking anew withdraws the one before. */
export async function invite(actor: Actor, input: Invite): Promise<InvitationView> {
  assertCan(actor, 'member:manage')
  const id = input.id ?? randomUUID()
  const repeated = await findInvitation(db(), actor, id)
  if (repeated) return asView(repeated)
  await takeFromInvitationLimits(actor, input.email)
  return db().transaction(async (tx) => {
    await lockParty(tx, actor)
    await assertMayGive(tx, actor, input.roles)
    const known = await findPersonByEmail(tx, input.email)
    if (known && (await findMember(tx, actor, known.id))) {
      throw new AppError('conflict', `${known.name} is in the party already. Change the roles in the list of members instead.`, {
        details: { fields: { email: 'is in the party already' } },
      })
    }
    await withdrawInvitationsTo(tx, actor, input.email)
    const made = await insertInvitation(tx, actor, {
      id,
      email: input.email,
      roles: input.roles,
      tokenHash: hashToken(linkToken('invitation', id)),
      invitedBy: actor.personId,
      expiresAt: new Date(Date.now() + openMs),
    })
    const row = made ? await findInvitation(tx, actor, id) : undefined
    if (!row) throw new AppError('conflict', 'That id is taken. Nobody was invited; please try again.')
    await mailInvitation(tx, row)
    await audit(tx, actor, 'invitation.send', { type: 'invitation', id }, { email: input.email, roles: input.roles })
    await notifyLive(tx, actor.partyId, [`party:${actor.partyId}`])
    return asView(row)
  })
}

/** Mails an open invitation again and gives it its full time anew. */
export async function sendInvitationAgain(actor: Actor, id: string): Promise<InvitationView> {
  assertCan(actor, 'member:manage')
  const open = await findInvitation(db(), actor, id)
  if (!open) throw notThere()
  await takeFromInvitationLimits(actor, open.email)
  return db().transaction(async (tx) => {
    await assertMayGive(tx, actor, open.roles)
    const extended = await extendInvitation(tx, actor, { id, expiresAt: new Date(Date.now() + openMs) })
    const row = extended ? await findInvitation(tx, actor, id) : undefined
    if (!row) throw notThere()
    await mailInvitation(tx, row)
    await audit(tx, actor, 'invitation.send-again', { type: 'invitation', id }, { email: row.email, roles: row.roles })
    await notifyLive(tx, actor.partyId, [`party:${actor.partyId}`])
    return asView(row)
  })
}

/** Withdraws an open invitation: its link says so from then on. */
export async function takeInvitationBack(actor: Actor, id: string): Promise<void> {
  assertCan(actor, 'member:manage')
  await db().transaction(async (tx) => {
    const row = await findInvitation(tx, actor, id)
    if (!row || !(await withdrawInvitation(tx, actor, id))) throw notThere()
    await audit(tx, actor, 'invitation.withdraw', { type: 'invitation', id }, { email: row.email })
    await notifyLive(tx, actor.partyId, [`party:${actor.partyId}`])
  })
}
