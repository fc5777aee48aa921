import type { Metadata } from 'next'
import { TourSpine } from '@/components/run/tour-spine'
import { RefreshOnLive } from '@/lib/client/live-provider'
import { dayKindWords } from '@/lib/contracts/tour'
import { hireTape } from './hire-tape'
import { pageRun } from './page-run'

export async function generateMetadata({ params }: LayoutProps<'/tours/[tourId]'>): Promise<Metadata> {
  const { tourId } = await params
  const { tour } = await pageRun(tourId)
  return { title: { default: tour.name, template: `%s · ${tour.name} · Hoopwright` } }
}

/** Every page of a tour: its name, its run as the spine, and the places of what is chosen on it. */
export default async function TourLayout({ params, children }: LayoutProps<'/tours/[tourId]'>) {
  const { tourId } = await params
  const run = await pageRun(tourId)
  const shows = run.days.flatMap((day) => day.shows)
  return (
    <>
      <RefreshOnLive topics={[`run:${tourId}`]} />
      <TourSpine
        tourId={tourId}
        tourName={run.tour.name}
        rigs={run.rigs.map(({ id, name }) => ({ id, name }))}
        note={shows.length === 1 ? '1 show' : `${shows.length} shows`}
        days={run.days.map(({ date, day, shows }) => ({
          id: day?.id ?? date,
          date,
          remark: day && day.kind !== 'off' ? (day.kind === 'show' ? 'no show yet' : dayKindWords[day.kind]) : null,
          shows: shows.map((show) => ({
            id: show.id,
            rigId: show.rigId,
            venue: show.venueName,
            town: show.town,
            bar: show.standing?.allCounts ?? null,
          })),
        }))}
        hires={run.hires.flatMap((hire) => hireTape(tourId, hire))}
      />
      {children}
    </>
  )
}
