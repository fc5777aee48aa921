import type { Metadata } from 'next'
import { rolesMay } from '@/lib/contracts/permissions'
import { pageActor } from '@/lib/server/auth/page-actor'
import { pageAnswer } from '@/lib/server/auth/page-answer'
import { readInvitations } from '@/lib/server/members/invite'
import { readMembers } from '@/lib/server/members/list-members'
import { Invitations } from './invitations'
import { Members } from './members'

export const metadata: Metadata = { title: 'Members' }

export default async function MembersPage() {
  const actor = await pageActor()
  const manages = rolesMay(actor.roles, 'member:manage')
  const members = await pageAnswer(readMembers(actor))
  const invitations = manages ? await pageAnswer(readInvitations(actor)) : []
  return (
    <>
      <Members partyId={actor.partyId} readerId={actor.personId} manages={manages} initial={members} />
      {manages && <Invitations partyId={actor.partyId} initial={invitations} />}
    </>
  )
}
