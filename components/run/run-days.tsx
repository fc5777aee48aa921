'use client'

import { OpenedForm } from '@/components/form/opened-form'
import { EmptyState } from '@/components/ui/empty-state'
import type { Day, Show } from '@/lib/contracts/tour'
import { dayKindWords } from '@/lib/contracts/tour'
import type { Standing } from '@/lib/advance/standing'
import { dateWords } from '@/lib/staging/calendar'
import { DayTools } from './day-tools'
import { DaysForm } from './days-form'
import type { ShowChoices } from './show-choices'
import { ShowRow } from './show-row'

export interface RunDaysProps {
  tourId: string
  days: readonly {
    date: string
    day: Day | null
    shows: readonly (Show & { standing: { standing: Standing } | null })[]
  }[]
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
        days.length === 0 && <p className="mt-4 text-soft">No day is like that. Show all, or look for a part of the name.</p>
      )}
      {days.length > 0 && (
        <ol className="mt-4 border-t-2 border-ink">
          {days.map(({ date, day, shows }) => (
            <li
              key={date}
              id={`day-${date}`}
              className="grid grid-cols-[4.5rem_minmax(0,1fr)] gap-x-3 border-b border-line py-1 sm:grid-cols-[6rem_minmax(0,1fr)]"
            >
              <span className={`py-1.5 ${shows.length > 0 ? 'name' : 'text-soft'}`}>{dateWords(date)}</span>
              <div className="min-w-0">
                {shows.map((show) => (
                  <ShowRow key={show.id} tourId={tourId} show={show} choices={choices} mayEdit={may.editShows} />
                ))}
                <div className="flex flex-wrap items-center gap-x-2">
                  {shows.length === 0 && (
                    <span className="mr-auto py-1 text-soft">{day ? dayKindWords[day.kind] : 'not on the run'}</span>
                  )}
                  {day?.remark && <span className="mr-auto py-1 text-soft">{day.remark}</span>}
                  {day ? (
                    <DayTools tourId={tourId} day={day} showCount={shows.length} choices={choices} may={may} />
                  ) : (
                    may.editDays && (
                      <OpenedForm action="Add this day" kind="quiet">
                        {(close) => <DaysForm tourId={tourId} firstDate={date} lastDate={date} onClose={close} />}
                      </OpenedForm>
                    )
                  )}
                </div>
              </div>
            </li>
          ))}
        </ol>
      )}
      {may.editDays && (
        <div className="mt-3">
          <OpenedForm action={nothingYet ? 'Add the days of the run' : 'Add days'} kind={nothingYet ? 'primary' : 'secondary'}>
            {(close) => <DaysForm tourId={tourId} firstDate={firstFree} lastDate={firstFree} onClose={close} />}
          </OpenedForm>
        </div>
      )}
    </>
  )
}
