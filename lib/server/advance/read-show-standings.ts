import { db } from '@/db/client'
import type { LineCounts } from '@/lib/advance/standing'
import type { Actor } from '@/lib/server/auth/actor'
import { assertCan } from '@/lib/server/auth/actor'
import type { SubjectStanding } from './derive-standings'
import { subjectStanding } from './derive-standings'
import { loadAdvance } from './load-advance'

export type ShowStanding = SubjectStanding & {
  showId: string
  /** The show's own lines and those of the hires that cover it; null while nothing of either was sent. */
  allCounts: LineCounts | null
}
export type HireStanding = SubjectStanding & { hireId: string }
export type ShowStandings = { shows: ShowStanding[]; hires: HireStanding[] }

/** Where every show and hire of a tour stands, in the order of the run; a constant number of statements. */
export async function readShowStandings(actor: Actor, tourId: string): Promise<ShowStandings> {
  assertCan(actor, 'party:read')
  const facts = await loadAdvance(db(), actor, { tourId })
  const now = new Date().toISOString()
  const hires = facts.hires.map((hire) => ({ ...subjectStanding(hire, now), hireId: hire.hire.id, showIds: hire.hire.showIds }))
  return {
    shows: facts.shows.map((show) => {
      const own = subjectStanding(show, now)
      const covering = hires.filter((hire) => hire.showIds.includes(show.show.id)).map((hire) => hire.counts)
      return { ...own, showId: show.show.id, allCounts: addCounts([own.counts, ...covering]) }
    }),
    hires: hires.map(({ showIds: _covered, ...hire }) => hire),
  }
}

function addCounts(all: readonly (LineCounts | null)[]): LineCounts | null {
  const known = all.filter((counts) => counts !== null)
  if (known.length === 0) return null
  const sum = (key: keyof LineCounts) => known.reduce((total, counts) => total + counts[key], 0)
  return { settled: sum('settled'), waiting: sum('waiting'), changed: sum('changed') }
}
