'use client'

import type { Route } from 'next'
import Link from 'next/link'
import { useSearchParams, useSelectedLayoutSegments } from 'next/navigation'
import type { RunStripDay, RunStripHire, RunStripShow } from '@/components/signature/run-strip'
import { RunStrip } from '@/components/signature/run-strip'
import { classes } from '@/components/ui/classes'
import type { NavLink } from '@/components/ui/nav-links'
import { NavLinks } from '@/components/ui/nav-links'

type SpineShow = Omit<RunStripShow, 'href' | 'chosen'> & { rigId: string }

export interface TourSpineProps {
  tourId: string
  tourName: string
  rigs: readonly { id: string; name: string }[]
  note: string
  days: readonly (Omit<RunStripDay, 'shows'> & { shows: readonly SpineShow[] })[]
  hires: readonly (Omit<RunStripHire, 'chosen'> & { name: string; href: Route })[]
}

const rigPlaces = [
  { segment: 'kit', label: 'Kit' },
  { segment: 'plot', label: 'Plot' },
  { segment: 'patch', label: 'Patch' },
  { segment: 'revisions', label: 'Revisions' },
] as const

/** Over every page of a tour: its name, the rig in hand, the places, and the run. What is chosen is read from the address. */
export function TourSpine({ tourId, tourName, rigs, note, days, hires }: TourSpineProps) {
  const segments = useSelectedLayoutSegments()
  const params = useSearchParams()
  const base = `/tours/${tourId}`
  const place = segments[0] ?? 'run'
  const showId = place === 'shows' ? segments[1] : undefined
  const showPlace = segments[2] ?? ''
  const chosen = days.flatMap((day) => day.shows).find((show) => show.id === showId)
  const hireId = place === 'hires' ? segments[1] : undefined
  const chosenHire = hires.find((hire) => hire.id === hireId)
  const chosenName = chosen?.venue ?? chosenHire?.name
  const rigId = chosen?.rigId ?? params.get('rig') ?? rigs[0]?.id
  const atRig = rigPlaces.some(({ segment }) => segment === place)
  const ofRig = (path: string, rig: string | undefined) => (rig ? `${path}?rig=${rig}` : path) as Route

  const links: NavLink[] = [
    { href: `${base}/run` as Route, label: 'Run', current: place === 'run' },
    ...rigPlaces.map(({ segment, label }) => ({
      href: ofRig(`${base}/${segment}`, rigId),
      label,
      current: place === segment,
    })),
    ...(chosen
      ? [
          { href: `${base}/shows/${chosen.id}` as Route, label: 'Show', current: showPlace === '' },
          { href: `${base}/shows/${chosen.id}/advance` as Route, label: 'Advance', current: showPlace === 'advance' },
          { href: `${base}/shows/${chosen.id}/bench` as Route, label: 'Bench', current: showPlace === 'bench' },
        ]
      : []),
    ...(chosenHire ? [{ href: chosenHire.href, label: 'Advance', current: true }] : []),
  ]
  // Going along the strip stays at the same place of the next show.
  const here = showPlace === 'advance' || showPlace === 'bench' ? `/${showPlace}` : ''
  return (
    <>
      <section aria-label="Tour" className="flex flex-wrap items-center gap-x-6 px-4 sm:px-6 print:hidden">
        <p className="min-w-0 truncate py-1 text-soft">
          {tourName}
          {chosenName ? `, ${chosenName}` : ''}
        </p>
        <NavLinks label="Places of this tour" links={links} />
        {atRig && rigs.length > 1 && (
          <nav aria-label="Rigs" className="flex flex-wrap gap-x-3">
            {rigs.map((rig) => (
              <Link
                key={rig.id}
                href={ofRig(`${base}/${place}`, rig.id)}
                aria-current={rig.id === rigId ? 'true' : undefined}
                className={classes(
                  'flex min-h-control items-center px-1 underline-offset-4',
                  rig.id === rigId ? 'font-bold' : 'text-soft hover:underline',
                )}
              >
                {rig.name}
              </Link>
            ))}
          </nav>
        )}
      </section>
      <RunStrip
        label={`The run of ${tourName}`}
        tour={{ href: `${base}/run` as Route, chosen: showId === undefined && hireId === undefined, note }}
        days={days.map((day) => ({
          ...day,
          shows: day.shows.map((show) => ({
            ...show,
            href: `${base}/shows/${show.id}${here}` as Route,
            chosen: show.id === showId,
          })),
        }))}
        hires={hires.map((hire) => ({ ...hire, chosen: hire.id === hireId }))}
      />
    </>
  )
}
