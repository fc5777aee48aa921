'use client'

import { useRef, useState } from 'react'
import { FormSheet } from '@/components/form/form-sheet'
import { useRemoval } from '@/components/form/use-removal'
import { Button } from '@/components/ui/button'
import type { MenuItem } from '@/components/ui/menu'
import { Menu } from '@/components/ui/menu'
import { Notice } from '@/components/ui/notice'
import type { Standing } from '@/lib/advance/standing'
import { createDays, createShow, removeDay, removeShow } from '@/lib/client/tours'
import type { Day, Show } from '@/lib/contracts/tour'
import { dayKindWords, showInputOf } from '@/lib/contracts/tour'
import { dateWords } from '@/lib/staging/calendar'
import { DayForm } from './day-form'
import { DaysForm } from './days-form'
import type { ShowChoices } from './show-choices'
import { ShowForm } from './show-form'
import { ShowLine } from './show-line'

export interface RunDayProps {
  tourId: string
  date: string
  /** Null for a date within the run that nobody put on it. */
  day: Day | null
  shows: readonly (Show & { standing: { standing: Standing } | null })[]
  choices: ShowChoices
  may: { editDays: boolean; editShows: boolean }
}

type Opened = { form: 'show'; show: Show | null } | { form: 'day' } | null

/** One day of the run with its shows, and one menu of what can be done with them. */
export function RunDay({ tourId, date, day, shows, choices, may }: RunDayProps) {
  const [opened, setOpened] = useState<Opened>(null)
  const { working, refusal, take } = useRemoval()
  const row = useRef<HTMLLIElement>(null)
  const close = () => {
    setOpened(null)
    // The form that had the focus is gone: reading goes on at its day.
    row.current?.focus()
  }
  const words = dateWords(date)
  const nameOf = (show: Show) => (shows.length > 1 && show.name ? show.name : show.venueName)

  const showItems: MenuItem[] = shows.flatMap((show) => [
    { key: `change ${show.id}`, label: `Change ${nameOf(show)}`, onSelect: () => setOpened({ form: 'show', show }) },
    {
      key: `off ${show.id}`,
      label: `Take ${nameOf(show)} off the run`,
      onSelect: () =>
        take({
          done: `${show.venueName} is off the run`,
          remove: () => removeShow(show.id, show.version),
          undo: { label: `Put ${show.venueName} back`, run: () => createShow(tourId, show.id, showInputOf(show)) },
        }),
    },
  ])
  const second: MenuItem = {
    key: 'second',
    label: 'Add a second show',
    onSelect: () => setOpened({ form: 'show', show: null }),
  }
  const dayItem: MenuItem = { key: 'day', label: `Change what ${words} is`, onSelect: () => setOpened({ form: 'day' }) }
  const offItem = (own: Day): MenuItem => ({
    key: 'off',
    label: `Take ${words} off the run`,
    onSelect: () =>
      take({
        done: `${words} is off the run`,
        remove: () => removeDay(own.id, own.version),
        undo: {
          label: `Put ${words} back`,
          run: () => createDays(tourId, { firstDate: date, lastDate: date, kind: own.kind, remark: own.remark }),
        },
      }),
  })
  const items = [
    ...(may.editShows ? showItems : []),
    ...(may.editShows && shows.length === 1 ? [second] : []),
    ...(may.editDays && day ? [dayItem] : []),
    ...(may.editDays && day && shows.length === 0 ? [offItem(day)] : []),
  ]
  return (
    <li ref={row} tabIndex={-1} id={`day-${date}`} className="scroll-mt-4 border-b border-line py-1">
      <div className="grid grid-cols-[5.5rem_minmax(0,1fr)] gap-x-3 sm:grid-cols-[6rem_minmax(0,1fr)_auto]">
        <span className={`py-1.5 ${shows.length > 0 ? 'name' : 'text-soft'}`}>{words}</span>
        <div className="min-w-0">
          {shows.map((show) => (
            <ShowLine key={show.id} tourId={tourId} show={show} />
          ))}
          {shows.length === 0 && (
            <p className="py-1.5 text-soft">
              {[day ? dayKindWords[day.kind] : 'not on the run', day?.remark].filter(Boolean).join(', ')}
            </p>
          )}
          {shows.length > 0 && day?.remark && <p className="text-sm text-soft">{day.remark}</p>}
        </div>
        <div className="col-start-2 -ml-4 flex flex-wrap items-start justify-end gap-x-1 sm:col-start-3 sm:ml-0">
          {shows.length === 0 && (day ? may.editShows : may.editDays) && (
            <Button kind="quiet" onClick={() => setOpened(day ? { form: 'show', show: null } : { form: 'day' })}>
              {day ? 'Put a show on it' : 'Add this day'}
            </Button>
          )}
          {items.length > 0 && (
            <Menu
              kind="quiet"
              align="end"
              label={working ? 'Taking it off…' : <MenuWords words={words} />}
              items={items}
            />
          )}
        </div>
      </div>
      {refusal && (
        <Notice kind="error" className="my-2">
          {refusal}
        </Notice>
      )}
      {opened && (
        <div className="my-2">
          <FormSheet key={opened.form === 'show' ? (opened.show?.id ?? 'new') : 'day'}>
            {opened.form === 'show' && day && (
              <ShowForm tourId={tourId} show={opened.show} dayId={day.id} choices={choices} onClose={close} />
            )}
            {opened.form === 'day' && day && <DayForm day={day} onClose={close} />}
            {opened.form === 'day' && !day && (
              <DaysForm tourId={tourId} firstDate={date} lastDate={date} onClose={close} />
            )}
          </FormSheet>
        </div>
      )}
    </li>
  )
}

function MenuWords({ words }: { words: string }) {
  return (
    <>
      Change<span className="sr-only"> {words}</span>
    </>
  )
}
