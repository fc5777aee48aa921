'use client'

import { useRouter } from 'next/navigation'
import type { z } from 'zod'
import { ChoiceField } from '@/components/form/choice-field'
import { SaveForm } from '@/components/form/save-form'
import { TextField } from '@/components/form/text-field'
import { showToast } from '@/components/ui/toast'
import { createDays } from '@/lib/client/tours'
import { useSavingForm } from '@/lib/client/use-saving-form'
import type { madeDaysSchema, NewDaysInput } from '@/lib/contracts/tour'
import { dayKinds, dayKindWords, newDaysInputSchema } from '@/lib/contracts/tour'

const kindOptions = dayKinds.map((value) => ({ value, label: dayKindWords[value] }))

export interface DaysFormProps {
  tourId: string
  /** The day after the run's last, or a date that is missing within it. */
  firstDate: string
  lastDate: string
  onClose: () => void
}

/** Adds the days of a span to the run; those that are there already are left as they are. */
export function DaysForm({ tourId, firstDate, lastDate, onClose }: DaysFormProps) {
  const router = useRouter()
  const saving = useSavingForm<NewDaysInput, z.infer<typeof madeDaysSchema>>({
    schema: newDaysInputSchema,
    start: { firstDate, lastDate, kind: 'off', remark: '' },
    version: null,
    key: 'days',
    save: ({ fields }) => createDays(tourId, fields),
    readCurrent: null,
    onSaved: ({ days, alreadyThere }) => {
      const made = days.length === 1 ? '1 day added' : `${days.length} days added`
      showToast(alreadyThere > 0 ? `${made}; ${alreadyThere} were there already` : made)
      onClose()
      router.refresh()
    },
  })
  const { form } = saving
  return (
    <SaveForm saving={saving} label="Days" action="Add these days" busy="Adding the days" names={{}} onClose={onClose}>
      <div className="grid gap-4 sm:grid-cols-3">
        <TextField form={form} name="firstDate" label="First date" type="date" />
        <TextField form={form} name="lastDate" label="Last date" type="date" />
        <ChoiceField form={form} name="kind" label="They are" options={kindOptions} />
      </div>
      <TextField form={form} name="remark" label="Remark" optional />
    </SaveForm>
  )
}
