import type { Metadata } from 'next'
import { ButtonLink } from '@/components/ui/button-link'
import { PlainPage } from '@/components/ui/plain-page'

export const metadata: Metadata = { title: 'Not with your role' }

export default function Forbidden() {
  return (
    <PlainPage title="Your role does not open this" actions={<ButtonLink href="/">Go to the first page</ButtonLink>}>
      <p>Nothing was changed. Somebody in your party can open it, or the owner can give or lend you the role.</p>
    </PlainPage>
  )
}
