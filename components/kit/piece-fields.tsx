import { useFormContext } from 'react-hook-form'
import { typeWords } from '@/lib/advance/kit-words'
import { Checkbox } from '@/components/ui/checkbox'
import type { EntryKind } from '@/lib/contracts/kit'
import { cymbalSpecSchema, hardwareSpecSchema, microphoneSpecSchema } from '@/lib/contracts/kit'
import type { PieceForm } from '@/lib/contracts/kit-form'
import { CommonFields } from './common-fields'
import { SizeField } from './size-field'
import { TextField } from './text-field'

const optionsOf = (types: readonly string[]) => types.map((type) => ({ value: type, label: typeWords(type) }))
const types = {
  cymbal: { label: 'What it is', options: optionsOf(cymbalSpecSchema.shape.type.options) },
  hardware: { label: 'What it is', options: optionsOf(hardwareSpecSchema.shape.type.options) },
  microphone: { label: 'Kind', options: optionsOf(microphoneSpecSchema.shape.type.options) },
}
const stands = optionsOf(microphoneSpecSchema.shape.stand.options)

/** A cymbal, a piece of hardware or a microphone. */
export function PieceFields({ kind }: { kind: Exclude<EntryKind, 'drum'> }) {
  const { register } = useFormContext<PieceForm>()
  return (
    <div className="flex flex-col gap-3">
      <div className="grid grid-cols-2 gap-x-4 gap-y-3 sm:grid-cols-4">
        <TextField path="spec.type" {...types[kind]} />
        {kind === 'cymbal' && <SizeField path="spec.diameterIn" label="Across" />}
        {kind === 'microphone' && <TextField path="spec.stand" label="Stand" options={stands} />}
        <TextField path="count" label="How many" unit="" />
      </div>
      <CommonFields />
      {kind === 'microphone' && <Checkbox {...register('spec.phantom')} label="Needs phantom power" />}
    </div>
  )
}
