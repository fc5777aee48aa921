import type { Metadata } from 'next'
import { notFound } from 'next/navigation'
import { cache } from 'react'
import { Contacts } from '@/components/directory/contacts'
import { Stages } from '@/components/directory/stages'
import { VenueHeading } from '@/components/directory/venue-heading'
import { idSchema } from '@/lib/contracts/common'
import { rolesMay } from '@/lib/contracts/permissions'
import { pageActor } from '@/lib/server/auth/page-actor'
import { pageAnswer } from '@/lib/server/auth/page-answer'
import { readVenue } from '@/lib/server/directory/venues'
import { readParty } from '@/lib/server/party/party-settings'

type Props = PageProps<'/directory/venues/[venueId]'>

const venueOf = cache(async (venueId: string) => {
  if (!idSchema.safeParse(venueId).success) notFound()
  return pageAnswer(readVenue(await pageActor(), venueId))
})

export async function generateMetadata({ params }: Props): Promise<Metadata> {
  const { venue } = await venueOf((await params).venueId)
  return { title: venue.name }
}

export default async function VenuePage({ params }: Props) {
  const { venueId } = await params
  const actor = await pageActor()
  const [{ venue, stages, contacts }, party] = await Promise.all([venueOf(venueId), pageAnswer(readParty(actor))])
  const mayEdit = rolesMay(actor.roles, 'directory:edit')
  return (
    <>
      <VenueHeading venue={venue} isBare={stages.length === 0 && contacts.length === 0} mayEdit={mayEdit} />
      <section aria-labelledby="stages" className="mt-8">
        <h2 id="stages" className="text-2xl">
          Stages
        </h2>
        <Stages venueId={venue.id} stages={stages} units={party.units} mayEdit={mayEdit} />
      </section>
      <section aria-labelledby="contacts" className="mt-8">
        <h2 id="contacts" className="text-2xl">
          Contacts
        </h2>
        <Contacts under={`/api/venues/${venue.id}`} contacts={contacts} mayEdit={mayEdit} />
      </section>
    </>
  )
}
