'use client'

import { useRouter } from 'next/navigation'
import { ChoiceField } from '@/components/form/choice-field'
import { LengthField } from '@/components/form/length-field'
import { NumberField } from '@/components/form/number-field'
import { SaveForm } from '@/components/form/save-form'
import { TextField } from '@/components/form/text-field'
import { TickSetField } from '@/components/form/tick-set-field'
import { stages } from '@/lib/client/directory'
import { useSavingForm } from '@/lib/client/use-saving-form'
import type { Stage, StageInput } from '@/lib/contracts/directory'
import { stageAccesses, stageAccessWords, stageInputSchema, stageSchema } from '@/lib/contracts/directory'
import type { LengthUnits } from '@/lib/staging/length'
import { formatLength } from '@/lib/staging/length'

const names = {
  name: 'Name',
  widthM: 'Width',
  depthM: 'Depth',
  heightM: 'Height',
  access: 'Access',
  volts: 'Volts',
  mainsHz: 'Mains frequency',
  inlets: 'Inlets',
}
const accessOptions = stageAccesses.map((value) => ({ value, label: stageAccessWords[value] }))
const mainsOptions = [
  { value: '50', label: '50 Hz' },
  { value: '60', label: '60 Hz' },
]

function fieldsOf(stage: Stage): StageInput {
  const { name, widthM, depthM, heightM, access, volts, inlets } = stage
  const mainsHz = stage.mainsHz === 50 || stage.mainsHz === 60 ? stage.mainsHz : null
  return { name, widthM, depthM, heightM, access, volts, mainsHz, inlets }
}

export interface StageFormProps {
  venueId: string
  stage: Stage | null
  units: LengthUnits
  onClose: () => void
}

/** A stage of a venue: how big it is, how a kit gets onto it and what it is powered by. */
export function StageForm({ venueId, stage, units, onClose }: StageFormProps) {
  const router = useRouter()
  const saving = useSavingForm<StageInput, Stage>({
    schema: stageInputSchema,
    // The two lengths are there to be typed: no stage has a size by itself.
    start: stage
      ? fieldsOf(stage)
      : {
          name: 'Main stage',
          widthM: Number.NaN,
          depthM: Number.NaN,
          heightM: 0,
          access: [],
          volts: null,
          mainsHz: null,
          inlets: '',
        },
    version: stage?.version ?? null,
    key: 'stage',
    save: ({ id, version, fields }) =>
      stage ? stages.change(stage.id, version, fields) : stages.create(`/api/venues/${venueId}/stages`, id, fields),
    readCurrent: (current) => {
      const row = stageSchema.safeParse(current).data
      return row ? { version: row.version, fields: fieldsOf(row) } : null
    },
    onSaved: () => {
      onClose()
      router.refresh()
    },
  })
  const { form } = saving
  const typed = units === 'metric' ? 'Such as 10 m or 32\'10"' : 'Such as 32 ft, 32\'10" or 10 m'
  return (
    <SaveForm
      saving={saving}
      label={stage ? stage.name : 'New stage'}
      action={stage ? 'Save the stage' : 'Add this stage'}
      busy="Saving the stage"
      names={names}
      say={(field, value) =>
        typeof value === 'number' && (field === 'widthM' || field === 'depthM' || field === 'heightM')
          ? formatLength(value, units)
          : undefined
      }
      onClose={onClose}
    >
      <TextField form={form} name="name" label="Name" />
      <div className="grid gap-4 sm:grid-cols-3">
        <LengthField form={form} name="widthM" label="Width" units={units} hint={typed} />
        <LengthField form={form} name="depthM" label="Depth" units={units} />
        <LengthField
          form={form}
          name="heightM"
          label="Height of the deck"
          units={units}
          hint="0 when it is the floor"
        />
      </div>
      <TickSetField form={form} name="access" legend="The way in" options={accessOptions} />
      <div className="grid gap-4 sm:grid-cols-3">
        <NumberField form={form} name="volts" label="Supply" unit="V" optional />
        <ChoiceField
          form={form}
          name="mainsHz"
          label="Mains frequency"
          options={mainsOptions}
          placeholder="Not known yet"
          optional
          emptyIsNull
          numeric
        />
        <TextField form={form} name="inlets" label="Inlets" optional hint="Such as 32 A three phase, stage left" />
      </div>
    </SaveForm>
  )
}
