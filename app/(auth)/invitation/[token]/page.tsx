import type { Metadata, Route } from 'next'
import { ButtonLink } from '@/components/ui/button-link'
import { Notice } from '@/components/ui/notice'
import { roleWords } from '@/lib/contracts/common'
import { currentSession } from '@/lib/server/auth/current-actor'
import type { ReadInvitation } from '@/lib/server/members/accept-invitation'
import { readInvitation } from '@/lib/server/members/accept-invitation'
import { DoorHeading } from '../../door-heading'
import { JoinButton } from './join-button'
import { JoinForm } from './join-form'
import { SignOutButton } from './sign-out-button'

export const metadata: Metadata = { title: 'Invitation', robots: { index: false }, referrer: 'no-referrer' }

function closedWords(invitation: Exclude<ReadInvitation, { standing: 'open' }>): { title: string; words: string } {
  switch (invitation.standing) {
    case 'used':
      return { title: 'This invitation was accepted already', words: `Sign in as ${invitation.email} to open ${invitation.partyName}.` }
    case 'withdrawn':
      return { title: 'This invitation was withdrawn', words: `Ask ${invitation.invitedBy} for a new one.` }
    case 'expired':
      return { title: 'This invitation has run out', words: `Ask ${invitation.invitedBy} to send it again.` }
    default:
      return { title: 'This link opens nothing', words: 'Part of its address may be missing. Open it again from the mail itself.' }
  }
}

export default async function InvitationPage({ params }: { params: Promise<{ token: string }> }) {
  const { token } = await params
  const invitation = await readInvitation(token)
  if (invitation.standing !== 'open') {
    const { title, words } = closedWords(invitation)
    return (
      <>
        <DoorHeading title={title}>
          <p>{words}</p>
        </DoorHeading>
        <ButtonLink href="/sign-in">Go to signing in</ButtonLink>
      </>
    )
  }
  const session = await currentSession()
  return (
    <>
      <DoorHeading title={invitation.partyName}>
        <p>
          {invitation.invitedBy} invites <strong className="text-ink">{invitation.email}</strong> to this touring party.
        </p>
        <p>
          Your role{invitation.roles.length > 1 ? 's' : ''} in it:{' '}
          <strong className="text-ink">{invitation.roles.map((role) => roleWords[role]).join(', ')}</strong>.
        </p>
      </DoorHeading>
      {session && session.email.toLowerCase() === invitation.email.toLowerCase() ? (
        <JoinButton token={token} partyName={invitation.partyName} />
      ) : session ? (
        <Notice word="For somebody else." action={<SignOutButton token={token} />}>
          You are signed in as {session.email}. This invitation is for {invitation.email}.
        </Notice>
      ) : invitation.known ? (
        <>
          <p className="mb-4">There is an account for that address. Sign in to it, then join.</p>
          <ButtonLink kind="primary" href={`/sign-in?next=${encodeURIComponent(`/invitation/${token}`)}` as Route}>
            Sign in to join
          </ButtonLink>
        </>
      ) : (
        <JoinForm token={token} email={invitation.email} partyName={invitation.partyName} />
      )}
    </>
  )
}
