import type { Metadata, Route } from 'next'
import { notFound } from 'next/navigation'
import { BenchBoard } from '@/components/bench/bench-board'
import { BenchCautions } from '@/components/bench/bench-cautions'
import { BenchLinks } from '@/components/bench/bench-links'
import { sheetWords } from '@/components/bench/bench-words'
import { SharedKitNotice } from '@/components/bench/shared-kit-notice'
import { ButtonLink } from '@/components/ui/button-link'
import { EmptyState } from '@/components/ui/empty-state'
import { Progress } from '@/components/ui/progress'
import { headView, standingSignOff } from '@/lib/client/bench/head-view'
import { RefreshOnLive } from '@/lib/client/live-provider'
import type { Bench } from '@/lib/contracts/bench'
import { idSchema } from '@/lib/contracts/common'
import { rolesMay } from '@/lib/contracts/permissions'
import { pageActor } from '@/lib/server/auth/page-actor'
import { pageAnswer } from '@/lib/server/auth/page-answer'
import { listBenchLinks } from '@/lib/server/bench/bench-links'
import { benchTopics, readBench } from '@/lib/server/bench/read-bench'

export const metadata: Metadata = { title: 'Bench' }

type Props = { params: Promise<{ tourId: string; showId: string }> }

/** The bench of one show as it happens. */
export default async function BenchBoardPage({ params }: Props) {
  const actor = await pageActor()
  const { tourId, showId } = await params
  if (!idSchema.safeParse(showId).success) notFound()
  const bench = await pageAnswer(readBench(actor, { showId }))
  const { links } = await pageAnswer(listBenchLinks(actor, { showId }))
  const mayLog = rolesMay(actor.roles, 'bench:log')
  return (
    <main id="main" className="mx-auto max-w-7xl px-4 pt-6 pb-24 sm:px-6">
      <RefreshOnLive topics={await benchTopics(actor, { showId })} />
      <div className="flex flex-wrap items-end justify-between gap-x-8 gap-y-3">
        <div>
          <h1 className="text-4xl">
            Bench <span className="text-soft">{bench.show.title}</span>
          </h1>
          <p className="mt-1 text-soft">{sheetWords(bench)}</p>
        </div>
        {mayLog && bench.drums.length > 0 && (
          <ButtonLink href={`/tours/${tourId}/shows/${showId}/bench/log` as Route}>Log readings here</ButtonLink>
        )}
      </div>
      <div className="mt-4 space-y-4">
        <SharedKitNotice owner={bench.show.mustNotRetune} />
        {bench.sheet === null ? (
          <EmptyState title="Nothing to tune by yet">
            First issue a revision of {bench.rig}: its tuning sheets are what the bench shows. Then print a bench link
            for whoever tunes at this show, and watch each head here as it happens.
          </EmptyState>
        ) : bench.drums.length === 0 ? (
          <EmptyState title="No drums on this sheet">
            Revision {bench.sheet.number} holds no drum. Add drums to the kit and issue the next revision.
          </EmptyState>
        ) : (
          <BenchProgress bench={bench} />
        )}
        {bench.drums.length > 0 && bench.readings.length === 0 && (
          <p className="max-w-prose text-soft">
            Nothing was read yet.{' '}
            {links.some(({ state }) => state === 'works') ? 'The bench link works' : 'Print a bench link below'};
            readings and sign-offs appear here by themselves.
          </p>
        )}
      </div>
      <BenchBoard bench={bench} />
      <BenchLinks
        {...{ showId, links }}
        zone={bench.show.zone}
        mayPrint={rolesMay(actor.roles, 'bench:print')}
        mayWithdraw={rolesMay(actor.roles, 'link:withdraw')}
      />
      {bench.drums.length > 0 && (
        <div className="mt-10 max-w-3xl">
          <BenchCautions />
        </div>
      )}
    </main>
  )
}

function BenchProgress({ bench }: { bench: Bench }) {
  const heads = bench.drums.flatMap((drum) => drum.heads.map((head) => headView(bench.readings, drum, head)))
  const read = heads.filter(({ state }) => state.missing.length === 0).length
  const signed = bench.drums.filter(({ entryId }) => standingSignOff(bench, entryId)).length
  return (
    <div className="grid max-w-3xl gap-x-8 gap-y-2 sm:grid-cols-2">
      <Progress label={`${read} of ${heads.length} heads read all round`} done={read} total={heads.length} />
      <Progress
        label={`${signed} of ${bench.drums.length} drums signed off`}
        done={signed}
        total={bench.drums.length}
      />
    </div>
  )
}
