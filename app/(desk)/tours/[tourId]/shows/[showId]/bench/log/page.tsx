import type { Metadata, Route } from 'next'
import Link from 'next/link'
import { forbidden, notFound } from 'next/navigation'
import { BenchApp } from '@/components/bench/bench-app'
import { idSchema } from '@/lib/contracts/common'
import { rolesMay } from '@/lib/contracts/permissions'
import { pageActor } from '@/lib/server/auth/page-actor'
import { pageAnswer } from '@/lib/server/auth/page-answer'
import { readBench } from '@/lib/server/bench/read-bench'

export const metadata: Metadata = { title: 'Log readings' }

type Props = { params: Promise<{ tourId: string; showId: string }> }

/** The bench as the link shows it, for the drum tech's own hands and name. */
export default async function LogPage({ params }: Props) {
  const actor = await pageActor()
  const { tourId, showId } = await params
  if (!idSchema.safeParse(showId).success) notFound()
  if (!rolesMay(actor.roles, 'bench:log')) forbidden()
  const bench = await pageAnswer(readBench(actor, { showId }))
  return (
    <>
      <p className="mx-auto max-w-xl px-4 pt-4">
        <Link href={`/tours/${tourId}/shows/${showId}/bench` as Route} className="underline underline-offset-4">
          Watch the whole bench
        </Link>
      </p>
      <BenchApp initial={bench} place={{ kind: 'desk', showId }} owner={actor.personId} ownName={actor.name} />
    </>
  )
}
