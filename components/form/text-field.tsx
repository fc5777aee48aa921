'use client'

import type { ComponentProps, ReactNode } from 'react'
import type { FieldPath, FieldValues, UseFormReturn } from 'react-hook-form'
import { Field } from '@/components/ui/field'
import { TextArea } from '@/components/ui/text-area'
import { TextInput } from '@/components/ui/text-input'
import { fieldError } from './field-error'

export interface TextFieldProps<Fields extends FieldValues> {
  form: UseFormReturn<Fields, unknown, Fields>
  name: FieldPath<Fields>
  label: ReactNode
  hint?: ReactNode
  optional?: boolean
  type?: 'text' | 'email' | 'tel' | 'date' | 'time'
  /** An empty field means that there is none, not an empty text. */
  emptyIsNull?: boolean
  lines?: number
  list?: string
  autoComplete?: ComponentProps<'input'>['autoComplete']
  className?: string
}

/** One text of a form, typed in one line or several. */
export function TextField<Fields extends FieldValues>(props: TextFieldProps<Fields>) {
  const {
    form,
    name,
    label,
    hint,
    optional,
    type = 'text',
    emptyIsNull,
    lines,
    list,
    autoComplete = 'off',
    className,
  } = props
  const registered = form.register(
    name,
    emptyIsNull ? { setValueAs: (text: unknown) => (text === '' ? null : text) } : {},
  )
  return (
    <Field
      label={label}
      hint={hint}
      optional={optional ?? false}
      error={fieldError(form, name)}
      {...(className ? { className } : {})}
    >
      {(control) =>
        lines ? (
          <TextArea {...control} {...registered} rows={lines} />
        ) : (
          <TextInput {...control} {...registered} type={type} list={list} autoComplete={autoComplete} />
        )
      }
    </Field>
  )
}
