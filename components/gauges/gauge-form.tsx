'use client'

import { NumberField } from '@/components/form/number-field'
import { SaveForm } from '@/components/form/save-form'
import { TextField } from '@/components/form/text-field'
import { gauges, useReadGaugesAgain } from '@/lib/client/gauges'
import { useSavingForm } from '@/lib/client/use-saving-form'
import type { Gauge, GaugeInput } from '@/lib/contracts/gauge'
import { gaugeInputSchema, gaugeScaleSchema, gaugeSchema } from '@/lib/contracts/gauge'

const names = { name: 'Name', scale: 'Dial', remark: 'Remark' }
const usualDial = { min: 0, max: 100, step: 1 }

export interface GaugeFormProps {
  partyId: string
  gauge: Gauge | null
  onSaved: (gauge: Gauge) => void
  onClose: () => void
}

/** A gauge's name and what is printed on its dial. */
export function GaugeForm({ partyId, gauge, onSaved, onClose }: GaugeFormProps) {
  const readAgain = useReadGaugesAgain(partyId)
  const fieldsOf = ({ name, scale, remark }: Gauge): GaugeInput => ({ name, scale, remark })
  const saving = useSavingForm<GaugeInput, Gauge>({
    schema: gaugeInputSchema,
    start: gauge ? fieldsOf(gauge) : { name: '', scale: usualDial, remark: '' },
    version: gauge?.version ?? null,
    key: 'gauge',
    save: ({ id, version, fields }) => (gauge ? gauges.change(gauge.id, version, fields) : gauges.create(id, fields)),
    readCurrent: (current) => {
      const row = gaugeSchema.safeParse(current).data
      return row ? { version: row.version, fields: fieldsOf(row) } : null
    },
    onSaved: (row) => {
      void readAgain()
      onSaved(row)
    },
  })
  const { form } = saving
  return (
    <SaveForm
      saving={saving}
      label={gauge ? gauge.name : 'New gauge'}
      action={gauge ? 'Save the gauge' : 'Add this gauge'}
      busy="Saving the gauge"
      names={names}
      say={(field, value) => (field === 'scale' ? dialWords(value) : undefined)}
      onClose={onClose}
    >
      <TextField
        form={form}
        name="name"
        label="Name"
        hint="Written on the gauge itself, best: one profile is one gauge in one hand."
      />
      <div className="grid gap-4 sm:grid-cols-3">
        <NumberField form={form} name="scale.min" label="Dial begins at" />
        <NumberField form={form} name="scale.max" label="Dial ends at" />
        <NumberField form={form} name="scale.step" label="One division" />
      </div>
      <TextField
        form={form}
        name="remark"
        label="Remark"
        optional
        lines={2}
        hint="Whose hand, where it is set down, how hard it is pressed."
      />
    </SaveForm>
  )
}

function dialWords(value: unknown): string | undefined {
  const scale = gaugeScaleSchema.safeParse(value).data
  return scale && `${scale.min} to ${scale.max}, one division ${scale.step}`
}
