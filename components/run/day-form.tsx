'use client'

import { useRouter } from 'next/navigation'
import { ChoiceField } from '@/components/form/choice-field'
import { SaveForm } from '@/components/form/save-form'
import { TextField } from '@/components/form/text-field'
import { changeDay } from '@/lib/client/tours'
import { useSavingForm } from '@/lib/client/use-saving-form'
import type { Day, DayInput } from '@/lib/contracts/tour'
import { dayInputSchema, dayKinds, dayKindWords, daySchema } from '@/lib/contracts/tour'
import { dateWords } from '@/lib/staging/calendar'

const kindOptions = dayKinds.map((value) => ({ value, label: dayKindWords[value] }))

/** What a day of the run is. */
export function DayForm({ day, onClose }: { day: Day; onClose: () => void }) {
  const router = useRouter()
  const saving = useSavingForm<DayInput, Day>({
    schema: dayInputSchema,
    start: { kind: day.kind, remark: day.remark },
    version: day.version,
    key: 'day',
    save: ({ version, fields }) => changeDay(day.id, version, fields),
    readCurrent: (current) => {
      const row = daySchema.safeParse(current).data
      return row ? { version: row.version, fields: { kind: row.kind, remark: row.remark } } : null
    },
    onSaved: () => {
      onClose()
      router.refresh()
    },
  })
  return (
    <SaveForm
      saving={saving}
      label={dateWords(day.date)}
      action={`Save ${dateWords(day.date)}`}
      busy="Saving the day"
      names={{ kind: 'It is', remark: 'Remark' }}
      onClose={onClose}
    >
      <div className="grid gap-4 sm:grid-cols-[12rem_1fr]">
        <ChoiceField form={saving.form} name="kind" label="It is" options={kindOptions} />
        <TextField form={saving.form} name="remark" label="Remark" optional />
      </div>
    </SaveForm>
  )
}
