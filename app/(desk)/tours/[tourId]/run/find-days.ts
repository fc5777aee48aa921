import type { RunListQuery } from '@/lib/contracts/tour'
import type { RunDay } from '@/lib/server/tours/read-run'

const plain = (text: string) => text.toLocaleLowerCase('en')

/** The days of a run that a search and a filter leave, sorted. A run is short enough to be read whole. */
export function findDays(days: readonly RunDay[], query: RunListQuery): RunDay[] {
  const wanted = plain(query.q)
  const found = days.filter((entry) => {
    if (query.filter === 'no-zone' && !entry.shows.some((show) => show.zone === null)) return false
    if (query.filter !== 'all' && query.filter !== 'no-zone' && entry.day?.kind !== query.filter) return false
    const said = [
      entry.day?.remark ?? '',
      ...entry.shows.flatMap((show) => [show.venueName, show.town, show.name, show.rigName]),
    ]
    return wanted === '' || said.some((text) => plain(text).includes(wanted))
  })
  const venueOf = (entry: RunDay) => entry.shows[0]?.venueName ?? ''
  const sorted =
    query.sort === 'venue'
      ? // Days without a show come last either way.
        found.sort(
          (a, b) =>
            Number(!venueOf(a)) - Number(!venueOf(b)) ||
            venueOf(a).localeCompare(venueOf(b)) ||
            a.date.localeCompare(b.date),
        )
      : found
  return query.order === 'down' ? sorted.reverse() : sorted
}
