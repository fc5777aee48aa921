import type { Metadata } from 'next'
import { GaugeList } from '@/components/gauges/gauge-list'
import { rolesMay } from '@/lib/contracts/permissions'
import { pageActor } from '@/lib/server/auth/page-actor'
import { pageAnswer } from '@/lib/server/auth/page-answer'
import { readGauges } from '@/lib/server/gauges/read-gauges'

export const metadata: Metadata = { title: 'Gauges' }

export default async function GaugesPage() {
  const actor = await pageActor()
  const gauges = await pageAnswer(readGauges(actor))
  return (
    <>
      <h1 className="text-4xl">Gauges</h1>
      <p className="mt-1 max-w-prose text-soft">
        A gauge’s numbers are its own: they differ by maker, head and hand. Calibrated by what its heads sound, it can
        say where to start on a head it has never touched.
      </p>
      <GaugeList partyId={actor.partyId} initial={gauges} mayEdit={rolesMay(actor.roles, 'gauge:edit')} />
    </>
  )
}
