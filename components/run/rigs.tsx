'use client'

import type { Route } from 'next'
import Link from 'next/link'
import { OpenedForm } from '@/components/form/opened-form'
import type { Rig } from '@/lib/contracts/tour'
import { RigForm } from './rig-form'

export interface RigsProps {
  tourId: string
  rigs: readonly { rig: Rig; shows: number }[]
  mayEdit: boolean
}

/** The ways this tour is played, in their order. */
export function Rigs({ tourId, rigs, mayEdit }: RigsProps) {
  const nextPosition = Math.max(-1, ...rigs.map(({ rig }) => rig.position)) + 1
  return (
    <>
      <ul className="mt-3 border-t-2 border-ink">
        {rigs.map(({ rig, shows }) => (
          <li key={rig.id} className="flex flex-wrap items-center gap-x-6 border-b border-line py-1">
            <Link
              href={`/tours/${tourId}/kit?rig=${rig.id}` as Route}
              className="name inline-flex min-h-control min-w-40 items-center text-lg underline-offset-4 hover:underline"
            >
              {rig.name}
            </Link>
            <span className="grow text-soft">{shows === 1 ? '1 show' : `${shows} shows`}</span>
            {mayEdit && (
              <OpenedForm action="Change" kind="quiet">
                {(close) => <RigForm tourId={tourId} rig={rig} nextPosition={nextPosition} onClose={close} />}
              </OpenedForm>
            )}
          </li>
        ))}
      </ul>
      {mayEdit && (
        <div className="mt-3">
          <OpenedForm action="Add a rig">
            {(close) => <RigForm tourId={tourId} rig={null} nextPosition={nextPosition} onClose={close} />}
          </OpenedForm>
        </div>
      )}
    </>
  )
}
