'use client'

import type { Route } from 'next'
import { useRouter } from 'next/navigation'
import { OpenedForm } from '@/components/form/opened-form'
import { RemoveButton } from '@/components/form/remove-button'
import { venues } from '@/lib/client/directory'
import type { Venue } from '@/lib/contracts/directory'
import { VenueForm } from './venue-form'

export interface VenueHeadingProps {
  venue: Venue
  /** Its stages and contacts would go with it, and could not be brought back by one step. */
  isBare: boolean
  mayEdit: boolean
}

/** A venue's name and place, and the ways to change it. */
export function VenueHeading({ venue, isBare, mayEdit }: VenueHeadingProps) {
  const router = useRouter()
  const { id: _id, version, ...fields } = venue
  return (
    <div>
      <h1 className="text-4xl">{venue.name}</h1>
      <p className="mt-1 text-lg text-soft">
        {[venue.town, venue.country].filter(Boolean).join(', ') || 'town not known yet'};{' '}
        {venue.zone ? `${venue.zone} time` : <span className="font-bold text-brass">time zone not known yet</span>}
      </p>
      {venue.remark && <p className="mt-2 max-w-prose whitespace-pre-line">{venue.remark}</p>}
      {mayEdit && (
        <div className="-ml-4 mt-1 flex flex-wrap items-center gap-x-2">
          <OpenedForm action="Change the venue" kind="quiet">
            {(close) => <VenueForm venue={venue} onClose={close} />}
          </OpenedForm>
          {isBare && (
            <RemoveButton
              action="Take it out of the directory"
              busy="Taking it out"
              done={`${venue.name} is out of the directory`}
              remove={() => venues.remove(venue.id, version)}
              undo={{ label: `Put ${venue.name} back`, run: () => venues.create('/api/venues', venue.id, fields) }}
              onRemoved={() => router.push('/directory/venues' as Route)}
            />
          )}
        </div>
      )}
    </div>
  )
}
