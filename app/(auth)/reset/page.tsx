import type { Metadata } from 'next'
import { DoorHeading } from '../door-heading'
import { LocalMailbox } from '../local-mailbox'
import { AskResetForm } from './ask-reset-form'

export const metadata: Metadata = { title: 'Choose a new password' }

export default function ResetPage() {
  return (
    <>
      <DoorHeading title="Choose a new password">
        <p>We mail you a link to choose one. Your present password holds until you do.</p>
      </DoorHeading>
      <AskResetForm />
      <LocalMailbox />
    </>
  )
}
