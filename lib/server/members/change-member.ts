import type { Db } from '@/db/client'
import { db } from '@/db/client'
import { countOtherOwners, deleteMember, findMember, updateMemberRoles } from '@/db/queries/member'
import { lockParty } from '@/db/queries/party'
import type { Role } from '@/lib/contracts/common'
import { mayGiveRoles } from '@/lib/contracts/member'
import { AppError } from '@/lib/errors'
import { audit } from '@/lib/server/audit/audit'
import type { Actor, MemberActor } from '@/lib/server/auth/actor'
import { assertCan } from '@/lib/server/auth/actor'
import { notifyLive } from '@/lib/server/live/notify-live'

/** The member to be changed, held against changes at the same time, with what must stand before either change. */
async function memberInHand(tx: Db, actor: MemberActor, personId: string, version: number, keepsOwner: boolean) {
  await lockParty(tx, actor)
  const member = await findMember(tx, actor, personId)
  if (!member) throw new AppError('not-found', 'That person is not in your party. Nothing was changed.')
  if (member.version !== version) {
    throw new AppError('stale', 'Somebody changed this member meanwhile. Yours is not saved; look at theirs, then save again.', {
      details: { current: { personId, roles: member.roles, version: member.version } },
    })
  }
  if (member.roles.includes('owner') && !keepsOwner && (await countOtherOwners(tx, actor, personId)) === 0) {
    throw new AppError('conflict', `${member.name} is the last owner. Make somebody else an owner first. Nothing was changed.`)
  }
  return member
}

/** Throws unless the actor may give or take these roles; a lent owner's role is not enough to make an owner. */
export async function assertMayGive(tx: Db, actor: MemberActor, given: readonly Role[]): Promise<void> {
  const self = await findMember(tx, actor, actor.personId)
  if (mayGiveRoles(self?.roles ?? [], given)) return
  throw new AppError('forbidden', 'Only an owner in their own right can make or unmake an owner. Nothing was changed.')
}

/** Sets a member's roles; they hold at the member's next request. */
export async function changeMemberRoles(
  actor: Actor,
  input: { personId: string; version: number; roles: Role[] },
): Promise<{ personId: string; roles: Role[]; version: number }> {
  assertCan(actor, 'member:manage')
  return db().transaction(async (tx) => {
    const member = await memberInHand(tx, actor, input.personId, input.version, input.roles.includes('owner'))
    const changed = [...member.roles, ...input.roles].filter(
      (role) => member.roles.includes(role) !== input.roles.includes(role),
    )
    await assertMayGive(tx, actor, changed)
    await updateMemberRoles(tx, actor, input)
    await audit(tx, actor, 'member.change-roles', { type: 'person', id: input.personId }, {
      name: member.name,
      before: member.roles,
      after: input.roles,
    })
    await notifyLive(tx, actor.partyId, [`party:${actor.partyId}`])
    return { personId: input.personId, roles: input.roles, version: input.version + 1 }
  })
}

/** Takes a person out of the party, with every role lent to them; what they did stays. */
export async function removeMember(actor: Actor, input: { personId: string; version: number }): Promise<void> {
  assertCan(actor, 'member:manage')
  await db().transaction(async (tx) => {
    const member = await memberInHand(tx, actor, input.personId, input.version, false)
    await assertMayGive(tx, actor, member.roles)
    await deleteMember(tx, actor, input)
    await audit(tx, actor, 'member.remove', { type: 'person', id: input.personId }, { name: member.name, roles: member.roles })
    await notifyLive(tx, actor.partyId, [`party:${actor.partyId}`])
  })
}
