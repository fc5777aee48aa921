'use client'

import { useId, useState } from 'react'
import type { AnswerContent } from '@/lib/advance/answer'
import { answerFault, asAskedAnswer } from '@/lib/advance/answer'
import { Button } from '../ui/button'
import { Field, FieldError } from '../ui/field'
import { TextArea } from '../ui/text-area'
import type { AnswerKind, DraftLine } from './answer-draft'
import { beginDraft, draftContent } from './answer-draft'
import { AnswerParts } from './answer-parts'

export interface AnswerFormProps {
  line: DraftLine
  /** What was said before, to begin a change from. */
  before: { content: AnswerContent; remark: string } | null
  /** Called with an answer that holds. */
  onAnswer: (said: { content: AnswerContent; remark: string }) => void
  /** The words of the button that keeps a typed answer. */
  keepLabel?: string
}

const choices: { kind: AnswerKind; label: string }[] = [
  { kind: 'as asked', label: 'As asked' },
  { kind: 'instead', label: 'Instead…' },
  { kind: 'not yet', label: 'Not yet, by…' },
  { kind: 'cant', label: "Can't" },
]

/** Today by the reader's own clock, YYYY-MM-DD. */
function today(): string {
  const now = new Date()
  return new Date(now.getTime() - now.getTimezoneOffset() * 60_000).toISOString().slice(0, 10)
}

/** One line's answer: as asked and can't in one press, the others with their particulars, a count apart when it is several. */
export function AnswerForm({ line, before, onAnswer, keepLabel = 'Keep this answer' }: AnswerFormProps) {
  const [kind, setKind] = useState<AnswerKind | null>(null)
  const [draft, setDraft] = useState(() => beginDraft(line, 'as asked', before?.content ?? null))
  const [remark, setRemark] = useState(before?.remark ?? '')
  const [fault, setFault] = useState<string | null>(null)
  const faultId = useId()

  function open(next: AnswerKind) {
    setKind(next)
    setDraft(beginDraft(line, next, line.count > 1 && before ? before.content : null))
    setFault(null)
  }
  function choose(next: AnswerKind) {
    if (next === 'as asked') onAnswer({ content: asAskedAnswer(line.count), remark: remark.trim() })
    else if (next === 'cant' && line.count === 1) onAnswer({ content: { asAsked: 0, instead: [], notYet: [], cant: 1 }, remark: remark.trim() })
    else open(next)
  }
  function keep() {
    const content = draftContent(line, draft)
    const found = answerFault(content, line, today())
    setFault(found)
    if (!found) onAnswer({ content, remark: remark.trim() })
  }

  return (
    <div className="grid gap-3">
      <div className="grid grid-cols-2 gap-2" role="group" aria-label={`Answer to ${line.words}`}>
        {choices.map((choice) => (
          <Button
            key={choice.kind}
            kind={choice.kind === 'as asked' || choice.kind === kind ? 'primary' : 'secondary'}
            aria-expanded={choice.kind === 'as asked' || (choice.kind === 'cant' && line.count === 1) ? undefined : choice.kind === kind}
            onClick={() => choose(choice.kind)}
          >
            {line.count > 1 && choice.kind === 'as asked' ? `All ${line.count} as asked` : choice.label}
          </Button>
        ))}
      </div>
      <details open={remark !== ''}>
        <summary className="flex min-h-control items-center text-sm underline underline-offset-4">Add a remark</summary>
        <Field label="Remark" hint="Goes with the answer you give.">
          {(control) => <TextArea {...control} rows={2} maxLength={2000} value={remark} onChange={(event) => setRemark(event.target.value)} />}
        </Field>
      </details>
      {kind && (
        <form
          noValidate
          className="grid gap-3 border-t border-line pt-3"
          onSubmit={(event) => {
            event.preventDefault()
            keep()
          }}
        >
          <AnswerParts line={line} kind={kind} draft={draft} onChange={setDraft} />
          <div role="alert">{fault && <FieldError id={faultId}>{`Not kept yet: ${fault}.`}</FieldError>}</div>
          <Button type="submit" kind="primary">
            {keepLabel}
          </Button>
        </form>
      )}
    </div>
  )
}
