import { Checkbox } from '@/components/ui/checkbox'
import { Field } from '@/components/ui/field'
import { NumberInput } from '@/components/ui/number-input'
import { TextInput } from '@/components/ui/text-input'
import type { NewReading } from '@/lib/client/bench/bench-session'
import { useState } from 'react'

export type Circumstances = Pick<NewReading, 'otherHead' | 'onStand' | 'gauge' | 'temperatureC'>

/** As the words beside the target ask for it. */
export const usualCircumstances: Circumstances = { otherHead: 'damped', onStand: false, gauge: '', temperatureC: null }

const hottest = 60
const coldest = -30

/** How the readings are taken, where that is not as asked; it stays until it is changed. */
export function ReadingCircumstances({
  value,
  change,
}: {
  value: Circumstances
  change: (value: Circumstances) => void
}) {
  const [typed, setTyped] = useState(value.temperatureC === null ? '' : String(value.temperatureC))
  const [fault, setFault] = useState<string | undefined>(undefined)

  function temperature(text: string) {
    setTyped(text)
    const degrees = Number(text.trim().replace(',', '.').replace('−', '-'))
    const known = text.trim() !== ''
    const right = !known || (degrees >= coldest && degrees <= hottest)
    setFault(right ? undefined : `From ${coldest} to ${hottest} °C; left out until then.`)
    change({ ...value, temperatureC: known && right ? degrees : null })
  }

  return (
    <details>
      <summary className="flex min-h-12 items-center font-bold underline underline-offset-4">
        {value.otherHead === 'open' || value.onStand ? 'How it is read: not as asked' : 'How it is read'}
      </summary>
      <div className="space-y-2 pt-1">
        <Checkbox
          label="The other head is damped"
          checked={value.otherHead === 'damped'}
          onChange={(event) => change({ ...value, otherHead: event.target.checked ? 'damped' : 'open' })}
        />
        <Checkbox
          label="The drum is off its stand"
          checked={!value.onStand}
          onChange={(event) => change({ ...value, onStand: !event.target.checked })}
        />
        <Field label="Which gauge" optional>
          {(control) => (
            <TextInput
              {...control}
              value={value.gauge}
              maxLength={80}
              onChange={(event) => change({ ...value, gauge: event.target.value })}
            />
          )}
        </Field>
        <Field label="Stage temperature" optional error={fault}>
          {(control) => (
            <NumberInput
              {...control}
              unit="°C"
              value={typed}
              maxLength={8}
              onChange={(event) => temperature(event.target.value)}
            />
          )}
        </Field>
      </div>
    </details>
  )
}
