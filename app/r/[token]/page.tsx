import type { Metadata } from 'next'
import { headers } from 'next/headers'
import { notFound } from 'next/navigation'
import { EndedLink } from '@/components/reply/ended-link'
import { ReplyPage } from '@/components/reply/reply-page'
import { AppError } from '@/lib/errors'
import { readReply } from '@/lib/server/answers/read-reply'
import { linkActor } from '@/lib/server/auth/link-actor'
import { clientAddress } from '@/lib/server/http/client-address'

export const metadata: Metadata = { title: 'Your answer', robots: { index: false, follow: false } }

/** The reply page behind a mailed link. Opening it changes nothing. */
export default async function Page({ params }: { params: Promise<{ token: string }> }) {
  const { token } = await params
  const found = await open(token, clientAddress(await headers()))
  return 'ended' in found ? <EndedLink reason={found.ended} token={token} /> : <ReplyPage initial={found.reply} token={token} />
}

type Opened = { reply: Awaited<ReturnType<typeof readReply>> } | { ended: 'withdrawn' | 'expired' }

async function open(token: string, address: string): Promise<Opened> {
  try {
    return { reply: await readReply(await linkActor(token, 'reply', address)) }
  } catch (error) {
    if (!(error instanceof AppError)) throw error
    if (error.code === 'gone') return { ended: error.details?.['reason'] === 'withdrawn' ? 'withdrawn' : 'expired' }
    if (error.code === 'not-found') notFound()
    throw error
  }
}
