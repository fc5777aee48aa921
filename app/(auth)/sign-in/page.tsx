import type { Metadata, Route } from 'next'
import Link from 'next/link'
import { redirect } from 'next/navigation'
import { Notice } from '@/components/ui/notice'
import { sitePath } from '@/lib/contracts/sign-in'
import { env } from '@/lib/env'
import { currentSession } from '@/lib/server/auth/current-actor'
import { DoorHeading } from '../door-heading'
import { LocalMailbox } from '../local-mailbox'
import { LinkForm } from './link-form'
import { PasswordForm } from './password-form'
import { signInError, signInNotice } from './sign-in-words'

export const metadata: Metadata = { title: 'Sign in' }

type Query = Promise<Record<string, string | string[] | undefined>>

export default async function SignInPage({ searchParams }: { searchParams: Query }) {
  const query = await searchParams
  const next = sitePath(query['next']) ?? sitePath(query['callbackUrl'], new URL(env().APP_URL).origin) ?? '/tours'
  if (await currentSession()) redirect(next as Route)
  const error = typeof query['error'] === 'string' ? signInError(query['error']) : undefined
  const notice = typeof query['said'] === 'string' ? signInNotice(query['said']) : undefined
  const signUpHref = next === '/tours' ? '/sign-up' : `/sign-up?next=${encodeURIComponent(next)}`
  return (
    <>
      <DoorHeading title="Sign in">
        <p>
          Were you sent a link to answer or to tune? Open it from the mail; it needs no account.
        </p>
      </DoorHeading>
      {error && (
        <Notice kind="error" className="mb-5">
          {error}
        </Notice>
      )}
      {notice && (
        <Notice kind="success" className="mb-5">
          {notice}
        </Notice>
      )}
      <PasswordForm next={next} />
      <h2 className="mt-9 mb-1 border-t border-line pt-5 text-xl">Or without a password</h2>
      <p className="mb-3 text-soft">A link by mail signs you in, once, within 20 minutes.</p>
      <LinkForm next={next} />
      <p className="mt-8 border-t border-line pt-4">
        New here?{' '}
        <Link href={signUpHref as Route} className="font-bold underline underline-offset-4">
          Begin with your name and mail address
        </Link>
      </p>
      <LocalMailbox />
    </>
  )
}
