import type { Metadata } from 'next'
import { ButtonLink } from '@/components/ui/button-link'
import { DoorHeading } from '../../door-heading'
import { LocalMailbox } from '../../local-mailbox'

export const metadata: Metadata = { title: 'Look in your mail' }

export default function SentPage() {
  return (
    <>
      <DoorHeading title="Look in your mail">
        <p>If we know that address, a link is on its way to it. It works once, for 20 minutes.</p>
        <p>Nothing after a few minutes? Look among the unwanted mail, or check the address and ask again.</p>
      </DoorHeading>
      <ButtonLink href="/sign-in">Back to signing in</ButtonLink>
      <LocalMailbox />
    </>
  )
}
