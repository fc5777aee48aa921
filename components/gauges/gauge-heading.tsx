'use client'

import type { Route } from 'next'
import Link from 'next/link'
import { useRouter } from 'next/navigation'
import { OpenedForm } from '@/components/form/opened-form'
import { RemoveButton } from '@/components/form/remove-button'
import { Button } from '@/components/ui/button'
import { Notice } from '@/components/ui/notice'
import { gauges, useChooseToursGauge, useReadGaugesAgain, useRestoreGauge } from '@/lib/client/gauges'
import type { Gauge } from '@/lib/contracts/gauge'
import { GaugeForm } from './gauge-form'

/** A gauge's name and dial, whether it goes on tour, and what can be done with it. */
export function GaugeHeading({ partyId, gauge, mayEdit }: { partyId: string; gauge: Gauge; mayEdit: boolean }) {
  const router = useRouter()
  const readAgain = useReadGaugesAgain(partyId)
  const choose = useChooseToursGauge(partyId)
  const restore = useRestoreGauge(partyId)
  const { id, version, name, scale, remark, toursGauge, removed } = gauge
  return (
    <header>
      <p className="text-sm">
        <Link href={'/party/gauges' as Route} className="inline-flex min-h-7 items-center underline underline-offset-4">
          All gauges
        </Link>
      </p>
      <h1 className="text-4xl wrap-anywhere">{name}</h1>
      <p className="mt-1 text-soft">
        dial{' '}
        <span className="figures">
          {scale.min}–{scale.max}
        </span>
        , one division <span className="figures">{scale.step}</span>
        {remark && `. ${remark}`}
      </p>
      {removed ? (
        <Notice
          kind="wait"
          word="Taken away"
          className="mt-3"
          action={
            mayEdit && (
              <Button
                busy={restore.isPending ? 'Putting it back' : null}
                onClick={() => restore.mutate({ gaugeId: id, version })}
              >
                Put this gauge back
              </Button>
            )
          }
        >
          This gauge is in no list any more; its pairs are kept.
        </Notice>
      ) : (
        toursGauge && (
          <p className="mt-2 border-l-4 border-spike pl-2">
            <strong>The tour’s gauge:</strong> revisions keep its pairs, and sheets say what it should read.
          </p>
        )
      )}
      {[choose.error, restore.error].map(
        (error, index) =>
          error && (
            <Notice key={index} kind="error" className="mt-3">
              {error.message}
            </Notice>
          ),
      )}
      {mayEdit && !removed && (
        <div className="mt-2 -ml-4 flex flex-wrap items-center gap-x-2">
          <Button
            kind="quiet"
            busy={choose.isPending ? 'Choosing' : null}
            onClick={() => choose.mutate(toursGauge ? null : id)}
          >
            {toursGauge ? 'Leave it off the tour' : 'Make it the tour’s gauge'}
          </Button>
          <OpenedForm action={`Change ${name}`} kind="quiet">
            {(close) => <GaugeForm partyId={partyId} gauge={gauge} onClose={close} onSaved={close} />}
          </OpenedForm>
          <RemoveButton
            action={`Take ${name} away`}
            busy="Taking it away"
            done={`${name} is gone`}
            remove={() => gauges.remove(id, version)}
            undo={{
              label: `Put ${name} back`,
              run: async () => {
                await gauges.restore(id, version + 1)
                await readAgain()
              },
            }}
            onRemoved={() => {
              void readAgain()
              router.push('/party/gauges' as Route)
            }}
          />
        </div>
      )}
    </header>
  )
}
