'use client'

import { OpenedForm } from '@/components/form/opened-form'
import { EmptyState } from '@/components/ui/empty-state'
import { DaysForm } from './days-form'
import type { RunDayProps } from './run-day'
import { RunDay } from './run-day'
import type { ShowChoices } from './show-choices'

export interface RunDaysProps {
  tourId: string
  days: readonly Pick<RunDayProps, 'date' | 'day' | 'shows'>[]
  nothingYet: boolean
  /** The day after the run's last. */
  firstFree: string
  choices: ShowChoices
  may: { editDays: boolean; editShows: boolean }
}

/** The days of the run with their shows, each to be changed where it stands. */
export function RunDays({ tourId, days, nothingYet, firstFree, choices, may }: RunDaysProps) {
  return (
    <>
      {nothingYet ? (
        <div className="mt-3">
          <EmptyState title="No days yet">
            {may.editDays
              ? 'Add the days of the run from the first date to the last; then put each show on its day.'
              : 'The tour manager adds the days; its shows then stand here.'}
          </EmptyState>
        </div>
      ) : (
        days.length === 0 && (
          <p className="mt-4 text-soft">No day is like that. Show all, or look for a part of the name.</p>
        )
      )}
      {days.length > 0 && (
        <ol className="mt-4 border-t-2 border-ink">
          {days.map((entry) => (
            <RunDay key={entry.date} tourId={tourId} {...entry} choices={choices} may={may} />
          ))}
        </ol>
      )}
      {may.editDays && (
        <div className="mt-3">
          <OpenedForm
            action={nothingYet ? 'Add the days of the run' : 'Add days'}
            kind={nothingYet ? 'primary' : 'secondary'}
          >
            {(close) => <DaysForm tourId={tourId} firstDate={firstFree} lastDate={firstFree} onClose={close} />}
          </OpenedForm>
        </div>
      )}
    </>
  )
}
