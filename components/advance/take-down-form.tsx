'use client'

import { useState } from 'react'
import { takeDownAnswer } from '@/lib/client/answers'
import type { AdvanceLine, AdvanceView } from '@/lib/contracts/advance'
import type { TakeDown } from '@/lib/contracts/answer'
import { takenHows, takenHowWords } from '@/lib/contracts/answer'
import { AnswerForm } from '../reply/answer-form'
import { Field } from '../ui/field'
import { Notice } from '../ui/notice'
import { Select } from '../ui/select'
import { TextInput } from '../ui/text-input'
import { useAct } from './use-act'

/** Now, as a date-and-time box of the reader's own clock holds it. */
function nowTyped(): string {
  const now = new Date()
  return new Date(now.getTime() - now.getTimezoneOffset() * 60_000).toISOString().slice(0, 16)
}

/** An answer that came by phone, by mail or in person: from whom, how, when, and what was said. */
export function TakeDownForm({ of, line, onDone }: { of: AdvanceView['of']; line: AdvanceLine; onDone: () => void }) {
  const [from, setFrom] = useState('')
  const [how, setHow] = useState<TakeDown['how']>('phone')
  const [at, setAt] = useState(nowTyped)
  const [missing, setMissing] = useState(false)
  const [id] = useState(() => crypto.randomUUID())
  const take = useAct((body: TakeDown) => takeDownAnswer(of, body))
  const when = new Date(at)
  return (
    <div className="mt-3 grid gap-3 border-t border-line pt-3">
      <div className="grid gap-2 sm:grid-cols-3">
        <Field label="From whom" error={missing && from.trim() === '' ? 'Write who gave the answer.' : undefined}>
          {(control) => <TextInput {...control} maxLength={120} value={from} onChange={(event) => setFrom(event.target.value)} />}
        </Field>
        <Field label="How">
          {(control) => (
            <Select
              {...control}
              value={how}
              onChange={(event) => setHow(takenHows.find((known) => known === event.target.value) ?? 'phone')}
              options={takenHows.map((known) => ({ value: known, label: takenHowWords[known] }))}
            />
          )}
        </Field>
        <Field label="When, by your clock" error={missing && Number.isNaN(when.getTime()) ? 'Give date and time.' : undefined}>
          {(control) => <TextInput {...control} type="datetime-local" value={at} onChange={(event) => setAt(event.target.value)} />}
        </Field>
      </div>
      <AnswerForm
        line={line}
        before={null}
        keepLabel="Take this answer down"
        onAnswer={({ content, remark }) => {
          if (from.trim() === '' || Number.isNaN(when.getTime())) return setMissing(true)
          take.run(
            { id, lineId: line.lineId, lineHash: line.hash, content, remark, from: from.trim(), how, at: when.toISOString() },
            { onSuccess: onDone },
          )
        }}
      />
      {take.busy && <Notice kind="wait">Taking the answer down</Notice>}
      {take.trouble && <Notice kind="error">{take.trouble}</Notice>}
    </div>
  )
}
