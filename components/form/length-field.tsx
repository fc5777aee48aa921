'use client'

import type { ReactNode } from 'react'
import { useState } from 'react'
import type { FieldPath, FieldValues, UseFormReturn } from 'react-hook-form'
import { useController } from 'react-hook-form'
import { Field } from '@/components/ui/field'
import { TextInput } from '@/components/ui/text-input'
import type { LengthUnits } from '@/lib/staging/length'
import { formatLength, parseLength } from '@/lib/staging/length'
import { fieldError } from './field-error'

export interface LengthFieldProps<Fields extends FieldValues> {
  form: UseFormReturn<Fields, unknown, Fields>
  name: FieldPath<Fields>
  label: ReactNode
  units: LengthUnits
  hint?: ReactNode
  optional?: boolean
  className?: string
}

/** A length, typed in metres or in feet and inches and held in metres. The text stays as it was typed. */
export function LengthField<Fields extends FieldValues>(props: LengthFieldProps<Fields>) {
  const { form, name, label, units, hint, optional, className } = props
  const { field } = useController({ control: form.control, name })
  const [text, setText] = useState(() =>
    typeof field.value === 'number' && Number.isFinite(field.value) ? formatLength(field.value, units) : '',
  )
  const take = (typed: string) => {
    setText(typed)
    // What cannot be read is no number, and the contract says what is allowed.
    field.onChange(typed.trim() === '' ? null : (parseLength(typed, units) ?? Number.NaN))
  }
  return (
    <Field
      label={label}
      hint={hint}
      optional={optional ?? false}
      error={fieldError(form, name)}
      {...(className ? { className } : {})}
    >
      {(control) => (
        <TextInput
          {...control}
          ref={field.ref}
          name={field.name}
          onBlur={field.onBlur}
          value={text}
          onChange={(event) => take(event.target.value)}
          autoComplete="off"
        />
      )}
    </Field>
  )
}
