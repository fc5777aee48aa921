import { randomUUID } from 'node:crypto'
import { db } from '@/db/client'
import { findMember } from '@/db/queries/member'
import { lockParty } from '@/db/queries/party'
import { endStandIn, findStandIn, insertStandIn, listStandIns } from '@/db/queries/stand-in'
import { roleWords } from '@/lib/contracts/common'
import type { LendRole, LentRole } from '@/lib/contracts/member'
import { lendableRoles, longestLoanDays } from '@/lib/contracts/member'
import { rolesMay } from '@/lib/contracts/permissions'
import { AppError } from '@/lib/errors'
import { audit } from '@/lib/server/audit/audit'
import type { Actor, MemberActor } from '@/lib/server/auth/actor'
import { assertCan } from '@/lib/server/auth/actor'
import { notifyLive } from '@/lib/server/live/notify-live'

const refuseField = (field: string, message: string) =>
  new AppError('invalid', `Please check ${field}: ${message}. Nothing was lent.`, { details: { fields: { [field]: message } } })

function loanEnd(untilAt: string): Date {
  const end = new Date(untilAt)
  const ms = end.getTime() - Date.now()
  if (ms <= 0) throw refuseField('untilAt', 'choose a time that is still to come')
  if (ms > longestLoanDays * 86_400_000) throw refuseField('untilAt', `at most ${longestLoanDays} days from now`)
  return end
}

type Row = { id: string; role: LentRole['role']; untilAt: Date; lentByName: string }
const asView = (row: Row): LentRole => ({
  id: row.id,
  role: row.role,
  untilAt: row.untilAt.toISOString(),
  lentBy: row.lentByName,
  mayEnd: true,
})

/** Lends a member a role until a time; it holds at once and stops by itself. Lent roles cannot be lent on. */
export async function lendRole(actor: Actor, input: LendRole): Promise<LentRole> {
  assertCan(actor, 'role:lend')
  const id = input.id ?? randomUUID()
  const untilAt = loanEnd(input.untilAt)
  return db().transaction(async (tx) => {
    await lockParty(tx, actor)
    const lender = await findMember(tx, actor, actor.personId)
    if (!lendableRoles(lender?.roles ?? []).includes(input.role)) {
      throw new AppError('forbidden', `You can lend only roles of your own, and ${roleWords[input.role]} is not one. An owner can. Nothing was lent.`)
    }
    const borrower = await findMember(tx, actor, input.personId)
    if (!borrower) throw new AppError('not-found', 'That person is not in your party. Nothing was lent.')
    const repeated = await findStandIn(tx, actor, id)
    if (repeated) return asView(repeated)
    if (borrower.roles.includes(input.role)) throw refuseField('role', `${borrower.name} has it already`)
    const running = (await listStandIns(tx, actor)).find(
      (loan) => loan.personId === input.personId && loan.role === input.role,
    )
    if (running) throw new AppError('conflict', `${borrower.name} has that role lent already. End that loan first. Nothing was lent.`)
    const made = await insertStandIn(tx, actor, { id, personId: input.personId, role: input.role, lentBy: actor.personId, untilAt })
    if (!made) throw new AppError('conflict', 'That id is taken. Nothing was lent; please try again.')
    await audit(tx, actor, 'stand-in.lend', { type: 'person', id: input.personId }, {
      name: borrower.name,
      role: input.role,
      untilAt: untilAt.toISOString(),
    })
    await notifyLive(tx, actor.partyId, [`party:${actor.partyId}`])
    return asView({ id, role: input.role, untilAt, lentByName: actor.name })
  })
}

/** Ends a loan before its time: an owner, whoever lent the role, or whoever holds it. */
export async function endLoan(actor: Actor, id: string): Promise<void> {
  assertCan(actor, 'party:read')
  await db().transaction(async (tx) => {
    const loan = await findStandIn(tx, actor, id)
    if (!loan) throw new AppError('not-found', 'That loan is not there. Nothing was changed.')
    assertMayEnd(actor, loan)
    if (!(await endStandIn(tx, actor, id))) throw new AppError('conflict', 'That loan has ended already. Nothing was changed.')
    const borrower = await findMember(tx, actor, loan.personId)
    await audit(tx, actor, 'stand-in.end', { type: 'person', id: loan.personId }, { name: borrower?.name, role: loan.role })
    await notifyLive(tx, actor.partyId, [`party:${actor.partyId}`])
  })
}

function assertMayEnd(actor: MemberActor, loan: { lentBy: string; personId: string }): void {
  if (rolesMay(actor.roles, 'member:manage') || [loan.lentBy, loan.personId].includes(actor.personId)) return
  throw new AppError('forbidden', 'Only an owner, whoever lent the role or whoever holds it can end this. Nothing was changed.')
}
