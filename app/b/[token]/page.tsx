import type { Metadata } from 'next'
import { headers } from 'next/headers'
import { notFound } from 'next/navigation'
import { BenchApp } from '@/components/bench/bench-app'
import { PlainPage } from '@/components/ui/plain-page'
import { AppError } from '@/lib/errors'
import { linkActor } from '@/lib/server/auth/link-actor'
import { showOfLink } from '@/lib/server/bench/assert-at-bench'
import { readBench } from '@/lib/server/bench/read-bench'
import { clientAddress } from '@/lib/server/http/client-address'

export const metadata: Metadata = { title: 'Bench' }

/** The bench of one show behind its link. Opening it changes nothing. */
export default async function BenchPage({ params }: { params: Promise<{ token: string }> }) {
  const { token } = await params
  const bench = await openBench(token)
  if ('closed' in bench) {
    return (
      <PlainPage title="This bench is closed">
        <p>{bench.closed} Whoever runs the show’s drums can print another bench link.</p>
        <p>What was logged through it is kept.</p>
      </PlainPage>
    )
  }
  return <BenchApp initial={bench} place={{ kind: 'link', token }} owner="link" ownName={null} />
}

async function openBench(token: string) {
  try {
    const actor = await linkActor(token, 'bench', clientAddress(await headers()))
    return await readBench(actor, { showId: showOfLink(actor) })
  } catch (error) {
    if (!(error instanceof AppError)) throw error
    if (error.code === 'gone') return { closed: error.message }
    if (error.code === 'not-found') notFound()
    throw error
  }
}
