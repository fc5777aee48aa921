'use client'

import { answerCount, insteadKind, insteadLugCounts } from '@/lib/advance/answer'
import { Field } from '../ui/field'
import { NumberInput } from '../ui/number-input'
import { Select } from '../ui/select'
import { TextInput } from '../ui/text-input'
import type { AnswerDraft, AnswerKind, DraftLine } from './answer-draft'
import { draftContent } from './answer-draft'

interface PartsProps {
  line: DraftLine
  /** The one kind that is answered; with a count of several all kinds stand beside one another. */
  kind: AnswerKind
  draft: AnswerDraft
  onChange: (draft: AnswerDraft) => void
}

/** The particulars of an answer: how many of each, what comes instead, by when. */
export function AnswerParts({ line, kind, draft, onChange }: PartsProps) {
  const several = line.count > 1
  const has = (own: AnswerKind, count: string) => (several ? count.trim() !== '' && count.trim() !== '0' : kind === own)
  return (
    <div className="grid gap-3">
      {several && <Counts line={line} draft={draft} onChange={onChange} />}
      {has('instead', draft.instead.n) && (
        <InsteadFields line={line} instead={draft.instead} onChange={(instead) => onChange({ ...draft, instead })} />
      )}
      {has('not yet', draft.notYet.n) && (
        <Field label="Not yet, but known by">
          {(control) => (
            <TextInput
              {...control}
              type="date"
              value={draft.notYet.by}
              onChange={(event) => onChange({ ...draft, notYet: { ...draft.notYet, by: event.target.value } })}
            />
          )}
        </Field>
      )}
    </div>
  )
}

function Counts({ line, draft, onChange }: Omit<PartsProps, 'kind'>) {
  const total = answerCount(draftContent(line, draft))
  const box = (label: string, value: string, change: (typed: string) => AnswerDraft) => (
    <Field label={label}>
      {(control) => <NumberInput {...control} inputMode="numeric" value={value} onChange={(event) => onChange(change(event.target.value))} />}
    </Field>
  )
  return (
    <fieldset>
      <legend className="text-sm font-bold">How many of the {line.count}</legend>
      <div className="mt-1 grid grid-cols-2 gap-2 sm:grid-cols-4">
        {box('As asked', draft.asAsked, (asAsked) => ({ ...draft, asAsked }))}
        {box('Instead', draft.instead.n, (n) => ({ ...draft, instead: { ...draft.instead, n } }))}
        {box('Not yet', draft.notYet.n, (n) => ({ ...draft, notYet: { ...draft.notYet, n } }))}
        {box("Can't", draft.cant, (cant) => ({ ...draft, cant }))}
      </div>
      <p className="mt-1 text-sm text-soft" aria-live="polite">
        <span className="figures">{Number.isNaN(total) ? '?' : total}</span> of <span className="figures">{line.count}</span> told
      </p>
    </fieldset>
  )
}

function InsteadFields(props: { line: DraftLine; instead: AnswerDraft['instead']; onChange: (instead: AnswerDraft['instead']) => void }) {
  const { line, instead, onChange } = props
  const kind = insteadKind(line.kind)
  const size = (label: string, field: 'diameterIn' | 'depthIn') => (
    <Field label={label}>
      {(control) => (
        <NumberInput {...control} unit="in" value={instead[field]} onChange={(event) => onChange({ ...instead, [field]: event.target.value })} />
      )}
    </Field>
  )
  return (
    <fieldset className="grid gap-3">
      <legend className="text-sm font-bold">What comes instead</legend>
      {kind !== 'other' && (
        <div className={kind === 'drum' ? 'grid grid-cols-3 gap-2' : 'grid grid-cols-2 gap-2'}>
          {size('Across', 'diameterIn')}
          {kind === 'drum' && size('Deep', 'depthIn')}
          {kind === 'drum' && (
            <Field label="Lugs a head">
              {(control) => (
                <Select
                  {...control}
                  value={instead.lugs}
                  onChange={(event) => onChange({ ...instead, lugs: event.target.value })}
                  options={insteadLugCounts.map((count) => ({ value: String(count), label: String(count) }))}
                  placeholder="Choose"
                />
              )}
            </Field>
          )}
        </div>
      )}
      <Field label={kind === 'other' ? 'In words' : 'More about it'} optional={kind !== 'other'}>
        {(control) => (
          <TextInput
            {...control}
            maxLength={400}
            value={instead.words}
            onChange={(event) => onChange({ ...instead, words: event.target.value })}
          />
        )}
      </Field>
    </fieldset>
  )
}
