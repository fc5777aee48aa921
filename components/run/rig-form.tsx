'use client'

import { useRouter } from 'next/navigation'
import { NumberField } from '@/components/form/number-field'
import { SaveForm } from '@/components/form/save-form'
import { TextField } from '@/components/form/text-field'
import { changeRig, createRig } from '@/lib/client/tours'
import { useSavingForm } from '@/lib/client/use-saving-form'
import type { Rig, RigInput } from '@/lib/contracts/tour'
import { rigInputSchema, rigSchema } from '@/lib/contracts/tour'

export interface RigFormProps {
  tourId: string
  rig: Rig | null
  /** Where a new rig stands in the order. */
  nextPosition: number
  onClose: () => void
}

/** One way of playing the tour. */
export function RigForm({ tourId, rig, nextPosition, onClose }: RigFormProps) {
  const router = useRouter()
  const saving = useSavingForm<RigInput, Rig>({
    schema: rigInputSchema,
    start: rig ? { name: rig.name, position: rig.position } : { name: '', position: nextPosition },
    version: rig?.version ?? null,
    key: 'rig',
    save: ({ id, version, fields }) => (rig ? changeRig(rig.id, version, fields) : createRig(tourId, id, fields)),
    readCurrent: (current) => {
      const row = rigSchema.safeParse(current).data
      return row ? { version: row.version, fields: { name: row.name, position: row.position } } : null
    },
    onSaved: () => {
      onClose()
      router.refresh()
    },
  })
  return (
    <SaveForm
      saving={saving}
      label={rig ? rig.name : 'New rig'}
      action={rig ? 'Save the rig' : 'Add this rig'}
      busy="Saving the rig"
      names={{ name: 'Name', position: 'Place in the order' }}
      onClose={onClose}
    >
      <div className="grid gap-4 sm:grid-cols-2">
        <TextField form={saving.form} name="name" label="Name" hint="Such as fly rig or acoustic" />
        <NumberField form={saving.form} name="position" label="Place in the order" hint="0 comes first" />
      </div>
    </SaveForm>
  )
}
