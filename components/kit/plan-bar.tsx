import { useState } from 'react'
import { Button } from '@/components/ui/button'
import { Field } from '@/components/ui/field'
import { NumberInput } from '@/components/ui/number-input'
import { Select } from '@/components/ui/select'
import type { DrumEntry } from '@/lib/contracts/kit'
import { noteText, noteValue } from '@/lib/contracts/kit-form'
import { NOTE_TEMPLATES } from '@/lib/tuning/note-template'
import type { NoteTemplate } from '@/lib/tuning/note-template'
import type { Anchor } from './note-draft'
import type { KitReader } from './kit-reader'

export interface PlanBarProps {
  /** Toms and floor toms, from which the others are stepped. */
  toms: readonly DrumEntry[]
  reader: KitReader
  /** Answers why it cannot be planned so, or null. */
  onPlan: (template: NoteTemplate, anchor: Anchor | null) => string | null
}

const templateHints: Record<string, string> = {
  fourths: 'a fourth for every 2 in of width',
  thirds: 'a major third for every 2 in of width',
  'equal-feel': 'every tom at the same film tension',
}

/** By which template to plan, and from which drum and note. */
export function PlanBar({ toms, reader, onPlan }: PlanBarProps) {
  const usual = toms.find(({ spec }) => spec.noteLocked) ?? toms[Math.floor((toms.length - 1) / 2)]
  const [templateId, setTemplateId] = useState(NOTE_TEMPLATES[0]?.id ?? '')
  const [anchorId, setAnchorId] = useState<string | null>(null)
  const [typed, setTyped] = useState<string | null>(null)
  const [problem, setProblem] = useState<string | null>(null)
  const anchor = toms.find(({ id }) => id === anchorId) ?? usual
  const template = NOTE_TEMPLATES.find(({ id }) => id === templateId)
  const text = typed ?? (anchor?.spec.note ? noteText(anchor.spec.note, reader.locale) : '')

  const plan = () => {
    if (!template) return
    const read = noteValue(text, reader)
    if ('problem' in read) return setProblem(read.problem)
    setProblem(onPlan(template, anchor && read.value ? { drumId: anchor.id, note: read.value } : null))
  }
  return (
    <form
      className="grid grid-cols-2 items-start gap-x-4 gap-y-3 lg:grid-cols-[1.2fr_1fr_1fr_auto]"
      onSubmit={(event) => {
        event.preventDefault()
        plan()
      }}
    >
      <Field label="Plan by" hint={templateHints[templateId]} className="max-lg:col-span-2">
        {(control) => (
          <Select
            {...control}
            value={templateId}
            onChange={(event) => setTemplateId(event.target.value)}
            options={NOTE_TEMPLATES.map(({ id, name }) => ({ value: id, label: name }))}
          />
        )}
      </Field>
      <Field
        label="From"
        hint={toms.length === 0 ? 'no toms: each drum in the middle of its range' : 'the anchor drum'}
      >
        {(control) => (
          <Select
            {...control}
            disabled={toms.length === 0}
            value={anchor?.id ?? ''}
            onChange={(event) => {
              setAnchorId(event.target.value)
              setTyped(null)
            }}
            options={toms.map(({ id, name }) => ({ value: id, label: name }))}
          />
        )}
      </Field>
      <Field label="At the note, or Hz" hint="empty: the middle of its range" error={problem ?? undefined}>
        {(control) => (
          <NumberInput
            {...control}
            inputMode="text"
            disabled={toms.length === 0}
            value={text}
            onChange={(event) => setTyped(event.target.value)}
          />
        )}
      </Field>
      <Button type="submit" className="max-lg:col-span-2 lg:mt-[1.625rem]">
        Plan the notes
      </Button>
    </form>
  )
}
