import type { Route } from 'next'
import Link from 'next/link'
import { classes } from '@/components/ui/classes'
import { KeepInView } from './keep-in-view'
import { layTape } from './lay-tape'
import { ShowBar } from './show-bar'
import type { ShowBarCounts } from './show-bar'

export interface RunStripShow {
  id: string
  href: Route
  venue: string
  town: string
  /** Lines by how they stand; null: nothing was asked yet. */
  bar: ShowBarCounts | null
  chosen: boolean
}

export interface RunStripDay {
  id: string
  /** Calendar date at the place, YYYY-MM-DD. Days follow one another without a hole. */
  date: string
  /** None, one or two. */
  shows: readonly RunStripShow[]
  /** What a day without a show is ("travel"); a day off says nothing. */
  remark?: string | null
}

export interface RunStripHire {
  id: string
  /** Supplier, what, and how it stands in words ("Fjord Backline hire, quote open"). */
  label: string
  firstDate: string
  lastDate: string
  state: 'settled' | 'waiting' | 'changed' | 'none'
  href?: Route
  chosen?: boolean
}

export interface RunStripProps {
  /** Names the strip ("Autumn run"). */
  label: string
  tour: { href: Route; chosen: boolean; note: string }
  days: readonly RunStripDay[]
  hires: readonly RunStripHire[]
}

const dayWords = new Intl.DateTimeFormat('en-GB', { weekday: 'short', day: 'numeric', timeZone: 'UTC' })
const monthWords = new Intl.DateTimeFormat('en-GB', { month: 'short', timeZone: 'UTC' })

/** "Mon 12", with the month on the strip's first day and on the first of each month. */
function dayLabel(date: string, first: boolean): string {
  const instant = new Date(`${date}T00:00:00Z`)
  const month = first || date.endsWith('-01') ? ` ${monthWords.format(instant)}` : ''
  // Some languages' formats put a comma after the weekday.
  return dayWords.format(instant).replace(',', '') + month
}

const tapes: Record<RunStripHire['state'], string> = {
  settled: 'bg-reed/25',
  waiting: 'bg-brass/25',
  changed: 'bg-plum/25',
  none: 'bg-wash',
}

/**
 * A tour's days on a true time axis: "Tour" first, then every day as wide as every other; shows are filled cells, days
 * off stay visible as gaps, hires lie as tape beneath the days they cover. It scrolls by itself on a narrow page.
 */
export function RunStrip({ label, tour, days, hires }: RunStripProps) {
  const lanes = layTape(
    hires,
    days.map((day) => day.date),
  )
  return (
    <nav aria-label={label} className="border-b-2 border-ink bg-sheet print:hidden">
      <KeepInView className="relative flex overflow-x-auto overscroll-x-contain">
        <Link
          href={tour.href}
          aria-current={tour.chosen ? 'page' : undefined}
          className={classes(
            'sticky left-0 z-10 flex w-24 shrink-0 flex-col justify-center border-r border-line px-3 py-2 focus-visible:-outline-offset-3',
            tour.chosen ? 'bg-ink text-paper' : 'bg-wash',
          )}
        >
          <span className="name text-lg">Tour</span>
          <span className={classes('text-xs', tour.chosen ? 'text-paper' : 'text-soft')}>{tour.note}</span>
        </Link>
        <ol className="grid grow pb-1" style={{ gridTemplateColumns: `repeat(${days.length}, minmax(5.125rem, 1fr))` }}>
          {days.map((day, index) => (
            <li key={day.id} className="row-start-1 flex min-w-0" style={{ gridColumn: index + 1 }}>
              {day.shows.length === 0 ? (
                <div className="px-1.5 py-2 text-xs text-soft">
                  <div>{dayLabel(day.date, index === 0)}</div>
                  {day.remark && <div>{day.remark}</div>}
                </div>
              ) : (
                day.shows.map((show) => <ShowCell key={show.id} show={show} day={dayLabel(day.date, index === 0)} />)
              )}
            </li>
          ))}
          {lanes.map(({ hire, lane, fromColumn, toColumn, startsBefore, endsAfter }) => (
            <li
              key={hire.id}
              className="mt-1 min-w-0"
              style={{ gridRow: lane + 2, gridColumn: `${fromColumn + 1} / ${toColumn + 2}` }}
            >
              <Tape hire={hire} torn={{ left: !startsBefore, right: !endsAfter }} />
            </li>
          ))}
        </ol>
      </KeepInView>
    </nav>
  )
}

function ShowCell({ show, day }: { show: RunStripShow; day: string }) {
  return (
    <Link
      href={show.href}
      aria-current={show.chosen ? 'page' : undefined}
      className={classes(
        'flex min-w-0 grow basis-0 flex-col border-l border-paper px-1.5 py-2 text-xs focus-visible:-outline-offset-3',
        show.chosen ? 'bg-ink text-paper' : 'bg-wash hover:bg-line',
      )}
    >
      <span className="name text-base whitespace-nowrap">{day}</span>
      <span className={classes('truncate', show.chosen ? 'text-paper' : 'text-ink')} title={show.venue}>
        {show.venue}
      </span>
      <span className={classes('truncate', show.chosen ? 'text-paper' : 'text-ink')} title={show.town}>
        {show.town}
      </span>
      <span className="mt-auto block pt-1">
        <ShowBar counts={show.bar} />
      </span>
    </Link>
  )
}

/** A strip of tape, torn where the hire really begins and ends, cut straight where it runs on past the days shown. */
function Tape({ hire, torn }: { hire: RunStripHire; torn: { left: boolean; right: boolean } }) {
  const left = torn.left ? '0 0, 4px 25%, 0 50%, 4px 75%, 0 100%' : '0 0, 0 100%'
  const right = torn.right
    ? '100% 100%, calc(100% - 4px) 75%, 100% 50%, calc(100% - 4px) 25%, 100% 0'
    : '100% 100%, 100% 0'
  const className = classes(
    'block truncate px-2.5 py-0.5 text-xs',
    hire.chosen ? 'bg-ink text-paper' : classes('text-ink', tapes[hire.state]),
  )
  const style = { clipPath: `polygon(${left}, ${right})` }
  return hire.href ? (
    <Link
      href={hire.href}
      aria-current={hire.chosen ? 'page' : undefined}
      className={classes(className, 'underline-offset-2 hover:underline focus-visible:-outline-offset-3')}
      style={style}
      title={hire.label}
    >
      {hire.label}
    </Link>
  ) : (
    <span className={className} style={style} title={hire.label}>
      {hire.label}
    </span>
  )
}
