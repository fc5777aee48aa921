'use client'

import type { UseFormReturn } from 'react-hook-form'
import { useWatch } from 'react-hook-form'
import { NumberField } from '@/components/form/number-field'
import { TextField } from '@/components/form/text-field'
import { Checkbox } from '@/components/ui/checkbox'
import type { ShowInput } from '@/lib/contracts/tour'

/** What a festival adds to a show: its slot, and a kit that other acts play too. */
export function FestivalFields({ form }: { form: UseFormReturn<ShowInput, unknown, ShowInput> }) {
  const slot = useWatch({ control: form.control, name: 'slot' })
  const sharedKit = useWatch({ control: form.control, name: 'sharedKit' })
  const dirty = { shouldDirty: true }
  return (
    <>
      <div className="border-t border-line pt-3">
        <Checkbox
          label="A festival slot"
          hint="Changeover, line check and where a rolling riser may wait"
          checked={slot !== null}
          onChange={(event) =>
            form.setValue(
              'slot',
              event.target.checked ? { changeoverMin: 20, lineCheckMin: 15, riserParking: '' } : null,
              dirty,
            )
          }
        />
        {slot && (
          <div className="mt-2 grid gap-4 sm:grid-cols-3">
            <NumberField form={form} name="slot.changeoverMin" label="Changeover" unit="min" />
            <NumberField form={form} name="slot.lineCheckMin" label="Line check" unit="min" />
            <TextField form={form} name="slot.riserParking" label="Riser parking" optional />
          </div>
        )}
      </div>
      <div className="border-t border-line pt-3">
        <Checkbox
          label="A shared kit"
          hint="The drums are played by other acts too"
          checked={sharedKit !== null}
          onChange={(event) =>
            form.setValue(
              'sharedKit',
              event.target.checked ? { owner: '', mayRetune: false, maySwap: '' } : null,
              dirty,
            )
          }
        />
        {sharedKit && (
          <div className="mt-2 grid items-end gap-4 sm:grid-cols-3">
            <TextField form={form} name="sharedKit.owner" label="Whose it is" />
            <TextField
              form={form}
              name="sharedKit.maySwap"
              label="What may be swapped"
              optional
              hint="Such as snare and cymbals"
            />
            <Checkbox label="May be retuned" {...form.register('sharedKit.mayRetune')} />
          </div>
        )}
      </div>
    </>
  )
}
