'use client'

import { Button } from '@/components/ui/button'
import { signOutHere } from '@/lib/client/sign-in'

/** Signs out and comes back to the invitation. */
export function SignOutButton({ token }: { token: string }) {
  return <Button onClick={() => void signOutHere(`/invitation/${token}`)}>Sign out and come back here</Button>
}
