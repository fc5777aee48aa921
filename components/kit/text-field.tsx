import type { ReactNode } from 'react'
import { get, useFormContext, useFormState } from 'react-hook-form'
import { Field } from '@/components/ui/field'
import { NumberInput } from '@/components/ui/number-input'
import { Select } from '@/components/ui/select'
import type { SelectOption } from '@/components/ui/select'
import { TextArea } from '@/components/ui/text-area'
import { TextInput } from '@/components/ui/text-input'
import { fieldId } from './field-id'

export interface TextFieldProps {
  /** Where the form holds the text. */
  path: string
  label: ReactNode
  hint?: ReactNode
  optional?: boolean
  /** Given: a number, a size or a note, in figures with this unit behind it ('' for none). */
  unit?: string
  /** Given: a choice instead of text. */
  options?: readonly SelectOption[]
  lines?: boolean
  className?: string
}

/** One field of the form round it, with its error. */
export function TextField({ path, label, hint, optional, unit, options, lines, className }: TextFieldProps) {
  const { register } = useFormContext()
  const { errors } = useFormState({ name: path })
  const error = (get(errors, path) as { message?: string } | undefined)?.message
  return (
    <Field
      {...{ label, hint, error, id: fieldId(path) }}
      {...(optional ? { optional } : {})}
      {...(className ? { className } : {})}
    >
      {(control) => {
        const props = { ...control, ...register(path) }
        if (options) return <Select {...props} options={options} />
        if (unit !== undefined) return <NumberInput {...props} inputMode="text" unit={unit} />
        return lines ? <TextArea {...props} rows={2} /> : <TextInput {...props} autoComplete="off" />
      }}
    </Field>
  )
}
