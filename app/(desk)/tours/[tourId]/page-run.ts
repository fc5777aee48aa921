import { notFound } from 'next/navigation'
import { cache } from 'react'
import { idSchema } from '@/lib/contracts/common'
import { pageActor } from '@/lib/server/auth/page-actor'
import { pageAnswer } from '@/lib/server/auth/page-answer'
import { readRun } from '@/lib/server/tours/read-run'

/** The run of a page and of the layout round it, read once a request. */
export const pageRun = cache(async (tourId: string) => {
  if (!idSchema.safeParse(tourId).success) notFound()
  return pageAnswer(readRun(await pageActor(), tourId))
})
