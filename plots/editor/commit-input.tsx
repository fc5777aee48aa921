'use client'

import { useState, type KeyboardEvent } from 'react'
import { Field } from '@/components/ui/field'
import { NumberInput } from '@/components/ui/number-input'
import { TextInput } from '@/components/ui/text-input'

export interface CommitInputProps {
  label: string
  /** What stands there now, as a person reads it. */
  value: string
  unit?: string
  hint?: string
  isText?: boolean
  isLabelHidden?: boolean
  disabled?: boolean
  className?: string
  /** Takes what was typed; returns what is wrong with it, or null. */
  onCommit: (typed: string) => string | null | Promise<string | null>
}

/** A box whose value is taken on Enter or on leaving it; Escape brings back what stood there. */
export function CommitInput(props: CommitInputProps) {
  const { label, value, unit, hint, isText, isLabelHidden, disabled, className, onCommit } = props
  const [draft, setDraft] = useState<string | null>(null)
  const [error, setError] = useState<string | null>(null)

  async function commit() {
    if (draft === null) return
    if (draft.trim() === value) {
      setDraft(null)
      setError(null)
      return
    }
    const wrong = await onCommit(draft.trim())
    setError(wrong)
    if (wrong === null) setDraft(null)
  }

  const box = {
    value: draft ?? value,
    disabled,
    onChange: (event: { currentTarget: HTMLInputElement }) => setDraft(event.currentTarget.value),
    onBlur: () => void commit(),
    onKeyDown: (event: KeyboardEvent<HTMLInputElement>) => {
      if (event.key === 'Enter') {
        event.preventDefault()
        void commit()
      }
      if (event.key === 'Escape') {
        setDraft(null)
        setError(null)
      }
      // Keys typed here must not move or remove the piece.
      event.stopPropagation()
    },
  }
  return (
    <Field
      label={isLabelHidden ? <span className="sr-only">{label}</span> : label}
      hint={hint}
      error={error ?? undefined}
      {...(className === undefined ? {} : { className })}
    >
      {(control) =>
        isText ? <TextInput {...control} {...box} /> : <NumberInput {...control} {...box} {...(unit ? { unit } : {})} />
      }
    </Field>
  )
}
