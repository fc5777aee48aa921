'use client'

import { useEffect, useRef, useState } from 'react'
import { Button } from '../ui/button'
import { Field } from '../ui/field'
import { TextInput } from '../ui/text-input'

/** Asks once who is answering; the answer that was just given goes out with the name. */
export function NameForm({ initial, onName, keepLabel, focus }: { initial: string; onName: (name: string) => void; keepLabel: string; focus: boolean }) {
  const [name, setName] = useState(initial)
  const [missing, setMissing] = useState(false)
  const input = useRef<HTMLInputElement>(null)
  useEffect(() => {
    if (focus) input.current?.focus()
  }, [focus])
  return (
    <form
      noValidate
      className="grid gap-2 border-2 border-ink bg-sheet p-3"
      onSubmit={(event) => {
        event.preventDefault()
        if (name.trim() === '') setMissing(true)
        else onName(name.trim())
      }}
    >
      <Field
        label="Your name"
        hint="Stands beside your answers. Kept on this phone, so you are asked once."
        error={missing && name.trim() === '' ? 'Write your name, so that we know who answered.' : undefined}
      >
        {(control) => (
          <TextInput {...control} ref={input} autoComplete="name" maxLength={120} value={name} onChange={(event) => setName(event.target.value)} />
        )}
      </Field>
      <Button type="submit" kind="primary">
        {keepLabel}
      </Button>
    </form>
  )
}
