import { db } from '@/db/client'
import { findMember, listMembers } from '@/db/queries/member'
import { listStandIns } from '@/db/queries/stand-in'
import type { Members } from '@/lib/contracts/member'
import { lendableRoles } from '@/lib/contracts/member'
import { rolesMay } from '@/lib/contracts/permissions'
import type { Actor } from '@/lib/server/auth/actor'
import { assertCan } from '@/lib/server/auth/actor'

/** Everybody in the party with their own roles and those lent to them now. */
export async function readMembers(actor: Actor): Promise<Members> {
  assertCan(actor, 'party:read')
  const [members, loans, self] = await Promise.all([
    listMembers(db(), actor),
    listStandIns(db(), actor),
    findMember(db(), actor, actor.personId),
  ])
  const manages = rolesMay(actor.roles, 'member:manage')
  return {
    members: members.map((member) => ({
      ...member,
      lent: loans
        .filter((loan) => loan.personId === member.personId)
        .map((loan) => ({
          id: loan.id,
          role: loan.role,
          untilAt: loan.untilAt.toISOString(),
          lentBy: loan.lentByName,
          mayEnd: manages || loan.lentBy === actor.personId || loan.personId === actor.personId,
        })),
    })),
    mayLend: lendableRoles(self?.roles ?? []),
  }
}
