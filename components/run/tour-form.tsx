'use client'

import { useRouter } from 'next/navigation'
import { SaveForm } from '@/components/form/save-form'
import { TextField } from '@/components/form/text-field'
import { changeTour } from '@/lib/client/tours'
import { useSavingForm } from '@/lib/client/use-saving-form'
import type { Tour, TourInput } from '@/lib/contracts/tour'
import { tourInputSchema, tourSchema } from '@/lib/contracts/tour'

/** The name of a tour. */
export function TourForm({ tour, onClose }: { tour: Tour; onClose: () => void }) {
  const router = useRouter()
  const saving = useSavingForm<TourInput, Tour>({
    schema: tourInputSchema,
    start: { name: tour.name },
    version: tour.version,
    key: 'tour',
    save: ({ version, fields }) => changeTour(tour.id, version, fields),
    readCurrent: (current) => {
      const row = tourSchema.safeParse(current).data
      return row ? { version: row.version, fields: { name: row.name } } : null
    },
    onSaved: () => {
      onClose()
      router.refresh()
    },
  })
  return (
    <SaveForm
      saving={saving}
      label={tour.name}
      action="Save the name"
      busy="Saving the name"
      names={{ name: 'Name' }}
      onClose={onClose}
    >
      <TextField form={saving.form} name="name" label="Name of the tour" />
    </SaveForm>
  )
}
