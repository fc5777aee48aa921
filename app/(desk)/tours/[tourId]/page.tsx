import type { Route } from 'next'
import { redirect } from 'next/navigation'

export default async function TourPage({ params }: PageProps<'/tours/[tourId]'>) {
  const { tourId } = await params
  redirect(`/tours/${tourId}/run` as Route)
}
