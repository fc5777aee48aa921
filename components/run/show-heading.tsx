'use client'

import type { Route } from 'next'
import { useRouter } from 'next/navigation'
import { OpenedForm } from '@/components/form/opened-form'
import { RemoveButton } from '@/components/form/remove-button'
import { createShow, removeShow } from '@/lib/client/tours'
import type { Show } from '@/lib/contracts/tour'
import { showInputOf } from '@/lib/contracts/tour'
import { dateWords } from '@/lib/staging/calendar'
import type { ShowChoices } from './show-choices'
import { ShowForm } from './show-form'

export interface ShowHeadingProps {
  tourId: string
  show: Show
  choices: ShowChoices
  mayEdit: boolean
}

/** A show's name and day, and the ways to change it. */
export function ShowHeading({ tourId, show, choices, mayEdit }: ShowHeadingProps) {
  const router = useRouter()
  return (
    <div>
      <h1 className="text-4xl">
        {show.venueName}
        {show.town && `, ${show.town}`}
      </h1>
      <p className="mt-1 text-lg text-soft">
        {[dateWords(show.date), show.name, show.rigName].filter(Boolean).join(', ')}
      </p>
      {mayEdit && (
        <div className="-ml-4 mt-1 flex flex-wrap items-center gap-x-2">
          <OpenedForm action="Change the show" kind="quiet">
            {(close) => <ShowForm tourId={tourId} show={show} dayId={show.dayId} choices={choices} onClose={close} />}
          </OpenedForm>
          <RemoveButton
            action="Take it off the run"
            busy="Taking it off"
            done={`${show.venueName} is off the run`}
            remove={() => removeShow(show.id, show.version)}
            undo={{ label: `Put ${show.venueName} back`, run: () => createShow(tourId, show.id, showInputOf(show)) }}
            onRemoved={() => router.push(`/tours/${tourId}/run` as Route)}
          />
        </div>
      )}
    </div>
  )
}
