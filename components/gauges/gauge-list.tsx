'use client'

import type { Route } from 'next'
import Link from 'next/link'
import { useRouter } from 'next/navigation'
import { OpenedForm } from '@/components/form/opened-form'
import { Button } from '@/components/ui/button'
import { EmptyState } from '@/components/ui/empty-state'
import { Notice } from '@/components/ui/notice'
import { useChooseToursGauge, useGauges } from '@/lib/client/gauges'
import type { Gauges } from '@/lib/contracts/gauge'
import { FEWEST_PAIRS } from '@/lib/tuning/gauge-calibration'
import { GaugeForm } from './gauge-form'
import { pairCountWords } from './pair-count-words'

export interface GaugeListProps {
  partyId: string
  initial: Gauges
  mayEdit: boolean
}

/** The party's gauges, the tour's first, each with how far it is calibrated. */
export function GaugeList({ partyId, initial, mayEdit }: GaugeListProps) {
  const router = useRouter()
  const { data } = useGauges(partyId, initial)
  const choose = useChooseToursGauge(partyId)
  const none = data.gauges.length === 0
  return (
    <div className="mt-5">
      {none && (
        <EmptyState title="No gauge yet">
          {mayEdit
            ? 'Add the gauge that goes on tour. Then read three heads with it, or three tunings of one head, and tap each: from three pairs on it can say what it will read on any head.'
            : 'The drum tech adds the gauge that goes on tour and reads three heads with it; what it will read on any head then stands here.'}
        </EmptyState>
      )}
      {choose.error && (
        <Notice kind="error" className="mb-3">
          {choose.error.message}
        </Notice>
      )}
      {!none && (
        <ul className="border-t-2 border-ink">
          {data.gauges.map((gauge) => (
            <li
              key={gauge.id}
              className={`flex flex-wrap items-center gap-x-6 gap-y-1 border-b border-line py-2 ${gauge.toursGauge ? 'border-l-4 border-l-spike pl-3' : ''}`}
            >
              <div className="min-w-0 grow basis-64">
                <h2 className="text-xl">
                  <Link
                    href={`/party/gauges/${gauge.id}` as Route}
                    className="underline decoration-1 underline-offset-4 hover:decoration-2"
                  >
                    {gauge.name}
                  </Link>
                </h2>
                <p className="text-sm text-soft">
                  dial{' '}
                  <span className="figures">
                    {gauge.scale.min}–{gauge.scale.max}
                  </span>
                  {gauge.remark && `, ${gauge.remark}`}
                </p>
              </div>
              <p className="basis-48">
                <span className="figures">{pairCountWords(gauge.pairs)}</span>
                {gauge.pairs < FEWEST_PAIRS && <span className="block text-sm text-brass">not calibrated yet</span>}
              </p>
              <div className="flex min-h-control basis-56 items-center">
                {gauge.toursGauge ? (
                  <strong>The tour’s gauge</strong>
                ) : (
                  mayEdit && (
                    <Button
                      kind="quiet"
                      className="-ml-4"
                      busy={choose.isPending && choose.variables === gauge.id ? 'Choosing it' : null}
                      onClick={() => choose.mutate(gauge.id)}
                    >
                      Make it the tour’s gauge<span className="sr-only">: {gauge.name}</span>
                    </Button>
                  )
                )}
              </div>
            </li>
          ))}
        </ul>
      )}
      {mayEdit && (
        <div className="mt-4">
          <OpenedForm action={none ? 'Add the first gauge' : 'Add a gauge'} kind={none ? 'primary' : 'secondary'}>
            {(close) => (
              <GaugeForm
                partyId={partyId}
                gauge={null}
                onClose={close}
                onSaved={({ id }) => router.push(`/party/gauges/${id}` as Route)}
              />
            )}
          </OpenedForm>
        </div>
      )}
    </div>
  )
}
