'use client'

import { useState } from 'react'
import type { FieldPath, FieldValues, UseFormReturn } from 'react-hook-form'
import { useController } from 'react-hook-form'
import { Field } from '@/components/ui/field'
import { NumberInput } from '@/components/ui/number-input'
import { micrometreWords, parsePlies } from '@/lib/staging/plies'
import { fieldError } from './field-error'

export interface PliesFieldProps<Fields extends FieldValues> {
  form: UseFormReturn<Fields, unknown, Fields>
  name: FieldPath<Fields>
  className?: string
}

/** The plies of a head, typed as the trade writes them and held as one thickness a ply, in mil. The text stays as it was typed. */
export function PliesField<Fields extends FieldValues>({ form, name, className }: PliesFieldProps<Fields>) {
  const { field } = useController({ control: form.control, name })
  const held: readonly number[] = Array.isArray(field.value) ? field.value : []
  const [text, setText] = useState(held.join(' + '))
  const { plyMils } = parsePlies(text)
  return (
    <Field
      label="Plies"
      hint={plyMils ? micrometreWords(plyMils) : 'Such as 10, or 7 + 7'}
      error={fieldError(form, name)}
      {...(className ? { className } : {})}
    >
      {(control) => (
        <NumberInput
          {...control}
          ref={field.ref}
          name={field.name}
          unit="mil"
          inputMode="text"
          value={text}
          onBlur={field.onBlur}
          onChange={(event) => {
            setText(event.target.value)
            // What cannot be read is no ply, and the contract says what is allowed.
            field.onChange(parsePlies(event.target.value).plyMils ?? [])
          }}
        />
      )}
    </Field>
  )
}
