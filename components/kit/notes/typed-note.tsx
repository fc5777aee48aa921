import { useState } from 'react'
import { Field } from '@/components/ui/field'
import { NumberInput } from '@/components/ui/number-input'

export interface TypedNoteProps {
  /** The note that stands now, as it is written. */
  value: string
  /** Takes what was typed; answers what is wrong with it, or null. */
  onCommit: (text: string) => string | null
}

/** A note by name or frequency, taken on Enter or on leaving the box; Escape brings back what stood there. */
export function TypedNote({ value, onCommit }: TypedNoteProps) {
  const [typed, setTyped] = useState<string | null>(null)
  const [problem, setProblem] = useState<string | null>(null)
  const leave = () => {
    setTyped(null)
    setProblem(null)
  }
  const commit = () => {
    if (typed === null || typed.trim() === value) return leave()
    const wrong = onCommit(typed)
    if (wrong === null) return leave()
    setProblem(wrong)
  }
  return (
    <Field label="Note, or Hz" error={problem ?? undefined} className="w-36">
      {(control) => (
        <NumberInput
          {...control}
          inputMode="text"
          value={typed ?? value}
          onChange={(event) => setTyped(event.target.value)}
          onBlur={commit}
          onKeyDown={(event) => {
            if (event.key === 'Enter') commit()
            if (event.key === 'Escape') leave()
          }}
        />
      )}
    </Field>
  )
}
