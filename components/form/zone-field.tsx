'use client'

import type { ReactNode } from 'react'
import { useId } from 'react'
import type { FieldPath, FieldValues, UseFormReturn } from 'react-hook-form'
import { TextField } from './text-field'

/** The zones by the names this browser knows. Forms open on the page, never on the server, so the two cannot differ. */
const zones = () => Intl.supportedValuesOf('timeZone')

export interface ZoneFieldProps<Fields extends FieldValues> {
  form: UseFormReturn<Fields, unknown, Fields>
  name: FieldPath<Fields>
  hint: ReactNode
}

/** A time zone by name, found by typing a part of it; empty while it is not known yet. */
export function ZoneField<Fields extends FieldValues>({ form, name, hint }: ZoneFieldProps<Fields>) {
  const listId = useId()
  return (
    <>
      <TextField form={form} name={name} label="Time zone" hint={hint} optional emptyIsNull list={listId} />
      <datalist id={listId}>
        {zones().map((zone) => (
          <option key={zone} value={zone} />
        ))}
      </datalist>
    </>
  )
}
