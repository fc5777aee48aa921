import type { Metadata } from 'next'
import { Button } from '@/components/ui/button'
import { ButtonLink } from '@/components/ui/button-link'
import { emailSchema } from '@/lib/contracts/common'
import { sitePath } from '@/lib/contracts/sign-in'
import { DoorHeading } from '../../door-heading'

export const metadata: Metadata = { title: 'Sign in', robots: { index: false } }

type Query = Promise<Record<string, string | string[] | undefined>>

/** Where a mailed link leads. Opening it changes nothing, since mail scanners open links too: the button signs in. */
export default async function SignInLinkPage({ searchParams }: { searchParams: Query }) {
  const query = await searchParams
  const email = emailSchema.safeParse(query['email'])
  const token = query['token']
  if (!email.success || typeof token !== 'string' || !/^[0-9a-f-]{36}\.[\w-]{43}$/.test(token)) {
    return (
      <>
        <DoorHeading title="This link is not whole">
          <p>Part of its address is missing. Open it again from the mail itself, or have a new one mailed to you.</p>
        </DoorHeading>
        <ButtonLink kind="primary" href="/sign-in">
          Have a new link mailed
        </ButtonLink>
      </>
    )
  }
  const given = new URLSearchParams({ email: email.data, token, callbackUrl: sitePath(query['next']) ?? '/tours' })
  return (
    <>
      <DoorHeading title="One press, and you are in">
        <p>
          This signs you in as <strong className="text-ink">{email.data}</strong>, on this device.
        </p>
      </DoorHeading>
      <form method="post" action={`/api/auth/callback/email?${given}`}>
        <Button type="submit" kind="primary" className="w-full py-3 text-lg sm:w-auto sm:px-8">
          Sign in
        </Button>
      </form>
    </>
  )
}
