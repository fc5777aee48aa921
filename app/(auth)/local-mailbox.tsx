import { connection } from 'next/server'
import { env } from '@/lib/env'

/** On a set-up of one's own no mail leaves the machine; this is where it lies. Asked at each request: a build knows no settings. */
export async function LocalMailbox() {
  await connection()
  const url = env().MAILBOX_URL
  if (!url) return null
  return (
    <p className="mt-6 border-t border-line pt-4 text-sm text-soft">
      This is a local set-up: no mail leaves this machine.{' '}
      <a href={url} className="font-bold text-ink underline underline-offset-4">
        Open the local mailbox
      </a>
    </p>
  )
}
