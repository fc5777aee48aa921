'use client'

import type { Route } from 'next'
import { useRouter } from 'next/navigation'
import { SaveForm } from '@/components/form/save-form'
import { TextField } from '@/components/form/text-field'
import { createTour } from '@/lib/client/tours'
import { useSavingForm } from '@/lib/client/use-saving-form'
import type { NewTourInput, Tour } from '@/lib/contracts/tour'
import { newTourInputSchema } from '@/lib/contracts/tour'

export interface NewTourFormProps {
  /** A party without a player names its first one here. */
  asksPlayer: boolean
  onClose: (() => void) | null
}

/** A tour begins with a name, its first rig and its dates. */
export function NewTourForm({ asksPlayer, onClose }: NewTourFormProps) {
  const router = useRouter()
  const saving = useSavingForm<NewTourInput, Tour>({
    schema: newTourInputSchema,
    start: { name: '', rigName: 'full rig', playerName: asksPlayer ? '' : null, firstDate: '', lastDate: '' },
    version: null,
    key: 'tour',
    save: ({ id, fields }) => createTour(id, fields),
    readCurrent: null,
    onSaved: (tour) => router.push(`/tours/${tour.id}/run` as Route),
  })
  const { form } = saving
  return (
    <SaveForm
      saving={saving}
      label="New tour"
      action="Make this tour"
      busy="Making the tour"
      names={{}}
      onClose={onClose}
    >
      <div className="grid gap-4 sm:grid-cols-2">
        <TextField form={form} name="name" label="Name of the tour" hint="Such as Autumn run" />
        <TextField
          form={form}
          name="rigName"
          label="First rig"
          hint="The way it is played: full rig, fly rig, acoustic"
        />
        <TextField form={form} name="firstDate" label="First date" type="date" />
        <TextField form={form} name="lastDate" label="Last date" type="date" />
      </div>
      {asksPlayer && (
        <TextField
          form={form}
          name="playerName"
          label="Player"
          hint="Who sits behind the kit; hand and throne height can follow"
        />
      )}
    </SaveForm>
  )
}
