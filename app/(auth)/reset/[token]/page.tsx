import type { Metadata } from 'next'
import { ButtonLink } from '@/components/ui/button-link'
import type { LinkStanding } from '@/lib/contracts/sign-in'
import { readPasswordReset } from '@/lib/server/people/redeem-password-reset'
import { DoorHeading } from '../../door-heading'
import { NewPasswordForm } from './new-password-form'

export const metadata: Metadata = { title: 'Choose a new password', robots: { index: false }, referrer: 'no-referrer' }

const closed: Record<Exclude<LinkStanding, 'open'>, { title: string; words: string }> = {
  used: { title: 'This link was used already', words: 'A password was chosen with it. If that was not you, ask for a new link now.' },
  withdrawn: { title: 'This link was withdrawn', words: 'Ask for a new one.' },
  expired: { title: 'This link has run out', words: 'It was good for an hour. Your password is as it was; ask for a new link.' },
  unknown: { title: 'This link opens nothing', words: 'Part of its address may be missing. Open it again from the mail itself, or ask for a new one.' },
}

export default async function NewPasswordPage({ params }: { params: Promise<{ token: string }> }) {
  const { token } = await params
  const standing = await readPasswordReset(token)
  if (standing !== 'open') {
    return (
      <>
        <DoorHeading title={closed[standing].title}>
          <p>{closed[standing].words}</p>
        </DoorHeading>
        <ButtonLink kind="primary" href="/reset">
          Ask for a new link
        </ButtonLink>
      </>
    )
  }
  return (
    <>
      <DoorHeading title="Choose a new password">
        <p>Saving it signs you out on every device.</p>
      </DoorHeading>
      <NewPasswordForm token={token} />
    </>
  )
}
