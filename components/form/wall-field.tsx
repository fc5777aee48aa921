'use client'

import type { ReactNode } from 'react'
import { useId } from 'react'
import type { FieldPath, FieldValues, UseFormReturn } from 'react-hook-form'
import { useController } from 'react-hook-form'
import { FieldError } from '@/components/ui/field'
import { TextInput } from '@/components/ui/text-input'
import { fieldError } from './field-error'

export interface WallFieldProps<Fields extends FieldValues> {
  form: UseFormReturn<Fields, unknown, Fields>
  name: FieldPath<Fields>
  /** What falls due then ("Answers due"). */
  label: string
  hint?: ReactNode
}

/** A date and a time as the wall at the place shows them, or neither. */
export function WallField<Fields extends FieldValues>({ form, name, label, hint }: WallFieldProps<Fields>) {
  const id = useId()
  const { ref, value: held, onBlur, onChange } = useController({ control: form.control, name }).field
  const value: { date: string; time: string } = held ?? { date: '', time: '' }
  const take = (next: { date: string; time: string }) => onChange(next.date === '' && next.time === '' ? null : next)
  const error = fieldError(form, name)
  return (
    <fieldset aria-describedby={error ? `${id}-error` : undefined} className="flex flex-col gap-1">
      <legend className="mb-1 text-sm font-bold">
        {label}
        <span className="font-normal text-soft">, not needed</span>
      </legend>
      <div className="flex gap-2">
        <TextInput
          ref={ref}
          type="date"
          aria-label={`${label}, date`}
          aria-invalid={error ? true : undefined}
          value={value.date}
          onBlur={onBlur}
          onChange={(event) => take({ ...value, date: event.target.value })}
        />
        <TextInput
          type="time"
          aria-label={`${label}, time`}
          aria-invalid={error ? true : undefined}
          value={value.time}
          onBlur={onBlur}
          onChange={(event) => take({ ...value, time: event.target.value })}
        />
      </div>
      {hint && <p className="text-sm text-soft">{hint}</p>}
      {error && <FieldError id={`${id}-error`}>{error}</FieldError>}
    </fieldset>
  )
}
