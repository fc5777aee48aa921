'use client'

import { useRouter } from 'next/navigation'
import type { Route } from 'next'
import { SaveForm } from '@/components/form/save-form'
import { TextField } from '@/components/form/text-field'
import { ZoneField } from '@/components/form/zone-field'
import { venues } from '@/lib/client/directory'
import { useSavingForm } from '@/lib/client/use-saving-form'
import type { Venue, VenueInput } from '@/lib/contracts/directory'
import { venueInputSchema, venueSchema } from '@/lib/contracts/directory'

const blank: VenueInput = { name: '', town: '', country: '', zone: null, remark: '' }
const names = { name: 'Name', town: 'Town', country: 'Country', zone: 'Time zone', remark: 'Remark' }

function fieldsOf({ name, town, country, zone, remark }: Venue): VenueInput {
  return { name, town, country, zone, remark }
}

/** A venue, new or as it stands. A new one is opened when it is saved: its stages and contacts come next. */
export function VenueForm({ venue, onClose }: { venue: Venue | null; onClose: () => void }) {
  const router = useRouter()
  const saving = useSavingForm<VenueInput, Venue>({
    schema: venueInputSchema,
    start: venue ? fieldsOf(venue) : blank,
    version: venue?.version ?? null,
    key: 'venue',
    save: ({ id, version, fields }) =>
      venue ? venues.change(venue.id, version, fields) : venues.create('/api/venues', id, fields),
    readCurrent: (current) => {
      const row = venueSchema.safeParse(current).data
      return row ? { version: row.version, fields: fieldsOf(row) } : null
    },
    onSaved: (row) => {
      onClose()
      if (venue) router.refresh()
      else router.push(`/directory/venues/${row.id}` as Route)
    },
  })
  const { form } = saving
  return (
    <SaveForm
      saving={saving}
      label={venue ? venue.name : 'New venue'}
      action={venue ? 'Save the venue' : 'Add this venue'}
      busy="Saving the venue"
      names={names}
      onClose={onClose}
    >
      <TextField form={form} name="name" label="Name" />
      <div className="grid gap-4 sm:grid-cols-2">
        <TextField form={form} name="town" label="Town" optional />
        <TextField form={form} name="country" label="Country" optional />
      </div>
      <ZoneField
        form={form}
        name="zone"
        hint="Every time of a show there is told in it. Leave it empty while it is not known yet."
      />
      <TextField form={form} name="remark" label="Remark" optional lines={3} />
    </SaveForm>
  )
}
