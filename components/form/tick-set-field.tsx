'use client'

import { useId } from 'react'
import type { FieldPath, FieldValues, UseFormReturn } from 'react-hook-form'
import { useController } from 'react-hook-form'
import { Checkbox } from '@/components/ui/checkbox'
import { FieldError } from '@/components/ui/field'
import { fieldError } from './field-error'

export interface TickSetFieldProps<Fields extends FieldValues> {
  form: UseFormReturn<Fields, unknown, Fields>
  name: FieldPath<Fields>
  legend: string
  options: readonly { value: string; label: string }[]
}

/** Any number out of a few, as boxes to tick. */
export function TickSetField<Fields extends FieldValues>({ form, name, legend, options }: TickSetFieldProps<Fields>) {
  const id = useId()
  const { field } = useController({ control: form.control, name })
  const chosen: readonly string[] = Array.isArray(field.value) ? field.value : []
  const error = fieldError(form, name)
  // In the order they are offered, so that ticking one off and on again changes nothing.
  const take = (value: string, ticked: boolean) =>
    field.onChange(
      options.map((option) => option.value).filter((known) => (known === value ? ticked : chosen.includes(known))),
    )
  return (
    <fieldset aria-describedby={error ? `${id}-error` : undefined}>
      <legend className="mb-1 text-sm font-bold">{legend}</legend>
      <div className="grid gap-x-6 sm:grid-cols-2">
        {options.map((option, index) => (
          <Checkbox
            key={option.value}
            ref={index === 0 ? field.ref : undefined}
            label={option.label}
            checked={chosen.includes(option.value)}
            onBlur={field.onBlur}
            onChange={(event) => take(option.value, event.target.checked)}
          />
        ))}
      </div>
      {error && <FieldError id={`${id}-error`}>{error}</FieldError>}
    </fieldset>
  )
}
