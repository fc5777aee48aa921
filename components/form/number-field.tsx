'use client'

import type { ReactNode } from 'react'
import type { FieldPath, FieldValues, UseFormReturn } from 'react-hook-form'
import { Field } from '@/components/ui/field'
import { NumberInput } from '@/components/ui/number-input'
import { fieldError } from './field-error'

export interface NumberFieldProps<Fields extends FieldValues> {
  form: UseFormReturn<Fields, unknown, Fields>
  name: FieldPath<Fields>
  label: ReactNode
  unit?: string
  hint?: ReactNode
  optional?: boolean
  className?: string
}

/** An empty field is no number; a decimal comma is a point. */
function readNumber(text: unknown): number | null {
  if (typeof text === 'number') return text
  return text === null || String(text).trim() === '' ? null : Number(String(text).replace(',', '.'))
}

/** One number of a form, with its unit. */
export function NumberField<Fields extends FieldValues>(props: NumberFieldProps<Fields>) {
  const { form, name, label, unit, hint, optional, className } = props
  return (
    <Field
      label={label}
      hint={hint}
      optional={optional ?? false}
      error={fieldError(form, name)}
      {...(className ? { className } : {})}
    >
      {(control) => (
        <NumberInput {...control} {...form.register(name, { setValueAs: readNumber })} {...(unit ? { unit } : {})} />
      )}
    </Field>
  )
}
