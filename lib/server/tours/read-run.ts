import { db } from '@/db/client'
import { listDays } from '@/db/queries/day'
import { listRigFacts, listRigs } from '@/db/queries/rig'
import { listShows } from '@/db/queries/show'
import { findTour } from '@/db/queries/tour'
import { listSuppliersWithoutContact } from '@/db/queries/supplier'
import { listVenuesWithoutContact } from '@/db/queries/venue'
import { rolesMay } from '@/lib/contracts/permissions'
import type { Permission } from '@/lib/contracts/permissions'
import type { NextStep } from '@/lib/advance/next-up'
import { nextUp } from '@/lib/advance/next-up'
import { readShowStandings } from '@/lib/server/advance/read-show-standings'
import type { Actor } from '@/lib/server/auth/actor'
import { assertCan } from '@/lib/server/auth/actor'
import { readHires } from '@/lib/server/hires/hires'
import { notThere } from '@/lib/server/refusals'
import { datesOf, dateWords } from '@/lib/staging/calendar'
import { showAnswer } from './show-answer'

export type Run = Awaited<ReturnType<typeof readRun>>
export type RunDay = Run['days'][number]
export type RunShow = RunDay['shows'][number]
export type RunHire = Run['hires'][number]

/**
 * A tour's run: every date from the first day to the last, with its shows, the hires over them and how each stands. A date
 * that nobody put on the run stands there without a day.
 */
export async function readRun(actor: Actor, tourId: string) {
  assertCan(actor, 'party:read')
  const tour = await findTour(db(), actor, tourId)
  if (!tour) throw notThere('tour')
  const [rigs, days, shows, hires, standings] = await Promise.all([
    listRigs(db(), actor, tourId),
    listDays(db(), actor, tourId),
    listShows(db(), actor, tourId),
    readHires(actor, tourId),
    readShowStandings(actor, tourId),
  ])
  const showStandings = new Map(standings.shows.map((standing) => [standing.showId, standing]))
  const hireStandings = new Map(standings.hires.map((standing) => [standing.hireId, standing]))
  const runShows = shows.map((row) => ({ ...showAnswer(row), standing: showStandings.get(row.id) ?? null }))
  const first = days[0]
  const last = days.at(-1)
  const dates = first && last ? datesOf(first.date, last.date) : []
  const dayOf = new Map(days.map((day) => [day.date, day]))
  const dateOf = new Map(shows.map((show) => [show.id, show.date]))
  return {
    tour,
    rigs,
    days: dates.map((date) => ({
      date,
      day: dayOf.get(date) ?? null,
      shows: runShows.filter((show) => show.date === date),
    })),
    hires: hires.map((hire) => {
      const covered = hire.showIds.flatMap((id) => dateOf.get(id) ?? []).sort()
      return {
        ...hire,
        standing: hireStandings.get(hire.id) ?? null,
        firstDate: hire.deliveryDate ?? covered[0] ?? null,
        lastDate: hire.collectionDate ?? covered.at(-1) ?? null,
        firstShowDate: covered[0] ?? null,
      }
    }),
  }
}

/** What the run needs from this person now, most urgent first. */
export async function readNextUp(actor: Actor, run: Run): Promise<NextStep[]> {
  assertCan(actor, 'party:read')
  const shows = run.days.flatMap((day) => day.shows)
  const [rigs, silentVenues, silentSuppliers] = await Promise.all([
    listRigFacts(db(), actor, run.tour.id),
    listVenuesWithoutContact(
      db(),
      actor,
      shows.map((show) => show.venueId),
    ),
    listSuppliersWithoutContact(
      db(),
      actor,
      run.hires.map((hire) => hire.supplierId),
    ),
  ])
  const may = (permission: Permission) => rolesMay(actor.roles, permission)
  const rigOfShow = new Map(shows.map((show) => [show.id, show.rigId]))
  return nextUp({
    today: new Date().toISOString().slice(0, 10),
    may: {
      editRun: may('tour:edit'),
      editKit: may('kit:edit'),
      issue: may('revision:issue'),
      editDirectory: may('directory:edit'),
      send: may('advance:send'),
      settle: may('answer:settle'),
    },
    dayCount: run.days.length,
    rigs,
    shows: shows.map((show) => ({
      id: show.id,
      about: showWords(show),
      date: show.date,
      rigIds: [show.rigId],
      zoneKnown: show.zone !== null,
      hasContact: !silentVenues.includes(show.venueId),
      sent: show.standing?.sent ?? false,
      standing: show.standing?.standing ?? 'not sent',
    })),
    hires: run.hires.flatMap((hire) => {
      const date = hire.firstShowDate ?? hire.firstDate
      if (!date) return []
      return {
        id: hire.id,
        about: `${hire.supplierName}, ${hire.showIds.length} ${hire.showIds.length === 1 ? 'show' : 'shows'} from ${dateWords(date)}`,
        date,
        rigIds: [...new Set(hire.showIds.flatMap((id) => rigOfShow.get(id) ?? []))],
        zoneKnown: hire.zone !== null,
        hasContact: !silentSuppliers.includes(hire.supplierId),
        sent: hire.standing?.sent ?? false,
        standing: hire.standing?.standing ?? 'not sent',
      }
    }),
  })
}

function showWords(show: { venueName: string; town: string; date: string; name: string }): string {
  return [show.name, show.venueName, show.town, dateWords(show.date)].filter(Boolean).join(', ')
}
