import type { Metadata } from 'next'
import { notFound } from 'next/navigation'
import { cache } from 'react'
import { GaugePage } from '@/components/gauges/gauge-page'
import { idSchema } from '@/lib/contracts/common'
import { rolesMay } from '@/lib/contracts/permissions'
import { pageActor } from '@/lib/server/auth/page-actor'
import { pageAnswer } from '@/lib/server/auth/page-answer'
import { readGauge, readKnownHeads } from '@/lib/server/gauges/read-gauges'

type Props = PageProps<'/party/gauges/[gaugeId]'>

const gaugeOf = cache(async (gaugeId: string) => {
  if (!idSchema.safeParse(gaugeId).success) notFound()
  return pageAnswer(readGauge(await pageActor(), gaugeId))
})

export async function generateMetadata({ params }: Props): Promise<Metadata> {
  const { gauge } = await gaugeOf((await params).gaugeId)
  return { title: gauge.name }
}

export default async function Gauge({ params }: Props) {
  const { gaugeId } = await params
  const actor = await pageActor()
  const [initial, heads] = await Promise.all([gaugeOf(gaugeId), pageAnswer(readKnownHeads(actor))])
  return (
    <GaugePage
      key={gaugeId}
      partyId={actor.partyId}
      initial={initial}
      heads={heads}
      mayEdit={rolesMay(actor.roles, 'gauge:edit')}
    />
  )
}
