'use client'

import type { Route } from 'next'
import Link from 'next/link'
import { OpenedForm } from '@/components/form/opened-form'
import { RemoveButton } from '@/components/form/remove-button'
import { StandingBadge } from '@/components/signature/standing-badge'
import { EmptyState } from '@/components/ui/empty-state'
import type { Standing } from '@/lib/advance/standing'
import { createHire, removeHire } from '@/lib/client/hires'
import type { Hire } from '@/lib/contracts/hire'
import { hireInputOf } from '@/lib/contracts/hire'
import { HireFacts } from './hire-facts'
import type { HireChoices } from './hire-form'
import { HireForm } from './hire-form'

export interface HiresProps {
  tourId: string
  hires: readonly { hire: Hire; standing: Standing | null; shows: readonly { id: string; label: string }[] }[]
  choices: HireChoices
  mayEdit: boolean
}

/** The hires of a tour: a supplier over several shows each. */
export function Hires({ tourId, hires, choices, mayEdit }: HiresProps) {
  return (
    <>
      {hires.length === 0 && (
        <div className="mt-3">
          <EmptyState title="No hire yet">
            {choices.shows.length === 0
              ? 'Put the shows on the run first; a hire then covers those that one supplier brings a kit to.'
              : 'Add a hire for the shows that one supplier brings a kit to: it is asked once and answers for all of them.'}
          </EmptyState>
        </div>
      )}
      {hires.length > 0 && (
        <ul className="mt-3 grid gap-6">
          {hires.map(({ hire, standing, shows }) => (
            <li key={hire.id} id={`hire-${hire.id}`} className="border-t-2 border-ink pt-2 target:border-spike">
              <div className="flex flex-wrap items-baseline gap-x-4">
                <h3 className="text-xl">{hire.supplierName}</h3>
                {hire.name && <span>{hire.name}</span>}
                <StandingBadge standing={standing ?? 'not sent'} />
                <span className="text-soft">{hire.confirmedAt ? 'confirmed' : 'not confirmed'}</span>
                <Link
                  href={`/tours/${tourId}/hires/${hire.id}/advance` as Route}
                  className="inline-flex min-h-7 items-center font-bold underline underline-offset-4"
                >
                  Its advance<span className="sr-only">, {hire.supplierName}</span>
                </Link>
              </div>
              <HireFacts hire={hire} shows={shows} />
              {mayEdit && (
                <div className="-ml-4 flex flex-wrap items-center">
                  <OpenedForm action="Change the hire" kind="quiet">
                    {(close) => <HireForm tourId={tourId} hire={hire} choices={choices} onClose={close} />}
                  </OpenedForm>
                  <RemoveButton
                    action="Take the hire away"
                    busy="Taking it away"
                    done={`The ${hire.supplierName} hire is gone`}
                    remove={() => removeHire(hire.id, hire.version)}
                    undo={{
                      label: `Put the ${hire.supplierName} hire back`,
                      run: () => createHire(tourId, hire.id, hireInputOf(hire)),
                    }}
                  />
                </div>
              )}
            </li>
          ))}
        </ul>
      )}
      {mayEdit && choices.shows.length > 0 && (
        <div className="mt-3">
          <OpenedForm action="Add a hire">
            {(close) => <HireForm tourId={tourId} hire={null} choices={choices} onClose={close} />}
          </OpenedForm>
        </div>
      )}
    </>
  )
}
