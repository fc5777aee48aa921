'use client'

import type { ReactNode } from 'react'
import type { FieldPath, FieldValues, UseFormReturn } from 'react-hook-form'
import { Field } from '@/components/ui/field'
import type { SelectOption } from '@/components/ui/select'
import { Select } from '@/components/ui/select'
import { fieldError } from './field-error'

export interface ChoiceFieldProps<Fields extends FieldValues> {
  form: UseFormReturn<Fields, unknown, Fields>
  name: FieldPath<Fields>
  label: ReactNode
  options: readonly SelectOption[]
  placeholder?: string
  hint?: ReactNode
  optional?: boolean
  /** The first, empty choice means none. */
  emptyIsNull?: boolean
  numeric?: boolean
  className?: string
}

/** One choice out of a list. */
export function ChoiceField<Fields extends FieldValues>(props: ChoiceFieldProps<Fields>) {
  const { form, name, label, options, placeholder, hint, optional, emptyIsNull, numeric, className } = props
  const read = (text: unknown) => (text === '' && emptyIsNull ? null : numeric ? Number(text) : text)
  return (
    <Field
      label={label}
      hint={hint}
      optional={optional ?? false}
      error={fieldError(form, name)}
      {...(className ? { className } : {})}
    >
      {(control) => (
        <Select
          {...control}
          {...form.register(name, { setValueAs: read })}
          options={options}
          {...(placeholder === undefined ? {} : { placeholder })}
        />
      )}
    </Field>
  )
}
