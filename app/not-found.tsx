import type { Metadata } from 'next'
import { ButtonLink } from '@/components/ui/button-link'
import { PlainPage } from '@/components/ui/plain-page'

export const metadata: Metadata = { title: 'Nothing here' }

export default function NotFound() {
  return (
    <PlainPage
      title="There is nothing at this address"
      actions={<ButtonLink href="/">Go to the first page</ButtonLink>}
    >
      <p>It may have been deleted, belong to a party you are not in, or the address may be cut short.</p>
      <p>If you came by a link in a mail, open it again from the mail itself, whole.</p>
    </PlainPage>
  )
}
