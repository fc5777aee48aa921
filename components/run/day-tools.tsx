'use client'

import { OpenedForm } from '@/components/form/opened-form'
import { RemoveButton } from '@/components/form/remove-button'
import { createDays, removeDay } from '@/lib/client/tours'
import type { Day } from '@/lib/contracts/tour'
import { dateWords } from '@/lib/staging/calendar'
import { DayForm } from './day-form'
import type { ShowChoices } from './show-choices'
import { ShowForm } from './show-form'

export interface DayToolsProps {
  tourId: string
  day: Day
  showCount: number
  choices: ShowChoices
  may: { editDays: boolean; editShows: boolean }
}

/** What can be done with a day: put a show on it while there is room, say what it is, take it off the run. */
export function DayTools({ tourId, day, showCount, choices, may }: DayToolsProps) {
  const words = dateWords(day.date)
  return (
    <>
      {may.editShows && showCount < 2 && (
        <OpenedForm action={showCount === 0 ? 'Put a show on it' : 'Add a second show'} kind="quiet">
          {(close) => <ShowForm tourId={tourId} show={null} dayId={day.id} choices={choices} onClose={close} />}
        </OpenedForm>
      )}
      {may.editDays && (
        <OpenedForm action="Change the day" kind="quiet">
          {(close) => <DayForm day={day} onClose={close} />}
        </OpenedForm>
      )}
      {may.editDays && showCount === 0 && (
        <RemoveButton
          action="Take it off the run"
          busy="Taking it off"
          done={`${words} is off the run`}
          remove={() => removeDay(day.id, day.version)}
          undo={{
            label: `Put ${words} back`,
            run: () => createDays(tourId, { firstDate: day.date, lastDate: day.date, kind: day.kind, remark: day.remark }),
          }}
        />
      )}
    </>
  )
}
