'use client'

import type { Route } from 'next'
import Link from 'next/link'
import { OpenedForm } from '@/components/form/opened-form'
import { RemoveButton } from '@/components/form/remove-button'
import { StandingBadge } from '@/components/signature/standing-badge'
import type { Standing } from '@/lib/advance/standing'
import { createShow, removeShow } from '@/lib/client/tours'
import type { Show } from '@/lib/contracts/tour'
import { showInputOf } from '@/lib/contracts/tour'
import type { ShowChoices } from './show-choices'
import { ShowForm } from './show-form'
import { ShowTimes } from './show-times'

export interface ShowRowProps {
  tourId: string
  show: Show & { standing: { standing: Standing } | null }
  choices: ShowChoices
  mayEdit: boolean
}

/** One show on its day. */
export function ShowRow({ tourId, show, choices, mayEdit }: ShowRowProps) {
  return (
    <div className="border-l-4 border-ink pl-3">
      <div className="flex flex-wrap items-baseline gap-x-3">
        <Link
          href={`/tours/${tourId}/shows/${show.id}` as Route}
          className="name inline-flex min-h-7 items-center text-lg underline-offset-4 hover:underline"
        >
          {show.venueName}
          {show.town && <span className="font-normal">, {show.town}</span>}
        </Link>
        {show.name && <span>{show.name}</span>}
        <StandingBadge standing={show.standing?.standing ?? 'not sent'} className="ml-auto" />
      </div>
      <p className="text-sm text-soft">
        {show.rigName}, {show.playerName}; <ShowTimes show={show} />
      </p>
      {mayEdit && (
        <div className="-ml-4 flex flex-wrap items-center">
          <OpenedForm action="Change the show" kind="quiet">
            {(close) => <ShowForm tourId={tourId} show={show} dayId={show.dayId} choices={choices} onClose={close} />}
          </OpenedForm>
          <RemoveButton
            action="Take it off the run"
            busy="Taking it off"
            done={`${show.venueName} is off the run`}
            remove={() => removeShow(show.id, show.version)}
            undo={{ label: `Put ${show.venueName} back`, run: () => createShow(tourId, show.id, showInputOf(show)) }}
          />
        </div>
      )}
    </div>
  )
}
