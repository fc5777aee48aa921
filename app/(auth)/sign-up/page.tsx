import type { Metadata } from 'next'
import Link from 'next/link'
import { sitePath } from '@/lib/contracts/sign-in'
import { DoorHeading } from '../door-heading'
import { LocalMailbox } from '../local-mailbox'
import { SignUpForm } from './sign-up-form'

export const metadata: Metadata = { title: 'Begin' }

type Query = Promise<Record<string, string | string[] | undefined>>

export default async function SignUpPage({ searchParams }: { searchParams: Query }) {
  return (
    <>
      <DoorHeading title="Begin">
        <p>We mail you a link that signs you in. Then you make your party, or join the one that invited you.</p>
      </DoorHeading>
      <SignUpForm next={sitePath((await searchParams)['next'])} />
      <p className="mt-8 border-t border-line pt-4">
        Here before?{' '}
        <Link href="/sign-in" className="font-bold underline underline-offset-4">
          Sign in
        </Link>
      </p>
      <LocalMailbox />
    </>
  )
}
