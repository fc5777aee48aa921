import type { Metadata } from 'next'
import { notFound } from 'next/navigation'
import { cache } from 'react'
import { idSchema } from '@/lib/contracts/common'
import { pageActor } from '@/lib/server/auth/page-actor'
import { pageAnswer } from '@/lib/server/auth/page-answer'
import { readShow } from '@/lib/server/tours/shows'
import { dateWords } from '@/lib/staging/calendar'

const showOf = cache(async (tourId: string, showId: string) => {
  if (!idSchema.safeParse(showId).success) notFound()
  const show = await pageAnswer(readShow(await pageActor(), showId))
  if (show.tourId !== tourId) notFound()
  return show
})

type Props = LayoutProps<'/tours/[tourId]/shows/[showId]'>

export async function generateMetadata({ params }: Props): Promise<Metadata> {
  const { tourId, showId } = await params
  const show = await showOf(tourId, showId)
  const name = `${show.venueName}, ${dateWords(show.date)}`
  return { title: { default: name, template: `%s · ${name} · Hoopwright` } }
}

/** The pages of one show, once it is known to be of this tour. */
export default async function ShowLayout({ params, children }: Props) {
  const { tourId, showId } = await params
  await showOf(tourId, showId)
  return children
}
