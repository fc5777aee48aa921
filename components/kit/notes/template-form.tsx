'use client'

import { useState } from 'react'
import { useController, useWatch } from 'react-hook-form'
import type { FieldPath, UseFormReturn } from 'react-hook-form'
import { fieldError } from '@/components/form/field-error'
import { NumberField } from '@/components/form/number-field'
import { SaveForm } from '@/components/form/save-form'
import { TextField } from '@/components/form/text-field'
import { Field } from '@/components/ui/field'
import { NumberInput } from '@/components/ui/number-input'
import { RadioGroup } from '@/components/ui/radio-group'
import { useSaveNoteTemplate } from '@/lib/client/note-templates'
import { useSavingForm } from '@/lib/client/use-saving-form'
import type { NoteTemplateInput, PartyNoteTemplate } from '@/lib/contracts/note-template'
import { noteTemplateInputSchema, partyNoteTemplateSchema } from '@/lib/contracts/note-template'
import { headRelationWords } from '@/lib/tuning/interval-name'
import { kickWords, readSemitones, semitonesText, stepsWords } from './template-words'

type TemplateForm = UseFormReturn<NoteTemplateInput, unknown, NoteTemplateInput>
type Steps = NoteTemplateInput['steps']

export interface TemplateFormProps {
  partyId: string
  /** The party's own template to change; null makes a new one that starts as `start`. */
  template: PartyNoteTemplate | null
  start: NoteTemplateInput
  onSaved: (template: PartyNoteTemplate) => void
  onClose: () => void
}

const names = {
  name: 'Name',
  steps: 'Toms',
  resonantCents: 'Resonant over batter',
  kickBelowLowestTom: 'Kick under the lowest tom',
}

function fieldsOf({ name, steps, resonantCents, kickBelowLowestTom }: NoteTemplateInput): NoteTemplateInput {
  return { name, steps, resonantCents, kickBelowLowestTom }
}

/** A template of the party's own: how the toms are stepped, how the heads stand, where the kick goes. */
export function TemplateForm({ partyId, template, start, onSaved, onClose }: TemplateFormProps) {
  const save = useSaveNoteTemplate(partyId)
  const saving = useSavingForm<NoteTemplateInput, PartyNoteTemplate>({
    ...{ schema: noteTemplateInputSchema, start: fieldsOf(start), version: template?.version ?? null, key: 'template' },
    save: ({ id, version, fields }) =>
      save.mutateAsync(
        template ? { id: template.id, version, template: fields } : { id, version: null, template: fields },
      ),
    readCurrent: (current) => {
      const row = partyNoteTemplateSchema.safeParse(current).data
      return row ? { version: row.version, fields: fieldsOf(row) } : null
    },
    onSaved,
  })
  const { form } = saving
  const cents = useWatch({ control: form.control, name: 'resonantCents' })
  return (
    <SaveForm
      saving={saving}
      label={template ? `Template ${template.name}` : 'New template'}
      action={template ? 'Save the template' : 'Keep this template'}
      busy="Keeping the template"
      names={names}
      say={(field, value) => {
        if (field === 'steps') return stepsWords(value as Steps)
        return field === 'kickBelowLowestTom' ? kickWords(value as number[]) : undefined
      }}
      onClose={onClose}
    >
      <div className="grid items-start gap-4 sm:grid-cols-2">
        <TextField form={form} name="name" label="Name" hint="such as High and open" />
        <NumberField
          form={form}
          name="resonantCents"
          label="Resonant over batter"
          unit="cents"
          hint={
            typeof cents === 'number' && Math.abs(cents) <= 1200
              ? headRelationWords(cents)
              : 'from −1200 to 1200; 0 is both heads alike'
          }
        />
        <StepsField form={form} />
        <SemitonesField
          form={form}
          name="kickBelowLowestTom"
          label="Kick under the lowest tom"
          say={kickWords}
          hint="semitones, several for a choice: 5, 7, 12; none: the middle of its own range"
        />
      </div>
    </SaveForm>
  )
}

const kinds: { value: Steps['kind']; label: string }[] = [
  { value: 'per-inch', label: 'By the inch' },
  { value: 'per-pair', label: 'Pair by pair' },
  { value: 'equal-feel', label: 'Equal feel' },
  { value: 'free', label: 'Free' },
]

const firstSteps: Record<Steps['kind'], Steps> = {
  'per-inch': { kind: 'per-inch', semitonesPerInch: 2.5 },
  'per-pair': { kind: 'per-pair', semitones: [5] },
  'equal-feel': { kind: 'equal-feel' },
  free: { kind: 'free' },
}

function StepsField({ form }: { form: TemplateForm }) {
  const { field } = useController({ control: form.control, name: 'steps' })
  const { kind } = field.value
  return (
    <div className="flex flex-col gap-2">
      <RadioGroup
        legend="From tom to tom"
        name="steps-kind"
        columns="two"
        options={kinds}
        value={kind}
        onChange={(event) => {
          const chosen = kinds.find(({ value }) => value === event.target.value)
          if (chosen) form.setValue('steps', firstSteps[chosen.value], { shouldDirty: true })
        }}
        hint={kind === 'equal-feel' || kind === 'free' ? stepsWords(field.value) : undefined}
        error={kind === 'equal-feel' || kind === 'free' ? fieldError(form, 'steps') : undefined}
      />
      {kind === 'per-inch' && (
        <NumberField
          form={form}
          name="steps.semitonesPerInch"
          label="Semitones for an inch of width"
          hint="2.5 is a fourth for every 2 in, 2 a major third"
        />
      )}
      {kind === 'per-pair' && (
        <SemitonesField
          form={form}
          name="steps.semitones"
          label="Semitones from tom to tom"
          say={(semitones) => stepsWords({ kind: 'per-pair', semitones })}
          hint="from the smallest down: 5, 5, 4"
        />
      )}
    </div>
  )
}

/** Several numbers of semitones, typed with commas; the text stays as it was typed. */
function SemitonesField(props: {
  form: TemplateForm
  name: FieldPath<NoteTemplateInput> & ('kickBelowLowestTom' | 'steps.semitones')
  label: string
  say: (semitones: number[]) => string
  hint: string
}) {
  const { form, name, label, say, hint } = props
  const { field } = useController({ control: form.control, name })
  const [text, setText] = useState(() => semitonesText(field.value))
  const semitones = readSemitones(text)
  const readable = text.trim() !== '' && semitones.every((each) => Number.isInteger(each) && each >= 0 && each <= 36)
  return (
    <Field label={label} hint={readable ? say(semitones) : hint} error={fieldError(form, name)}>
      {(control) => (
        <NumberInput
          {...control}
          ref={field.ref}
          inputMode="text"
          name={field.name}
          onBlur={field.onBlur}
          value={text}
          onChange={(event) => {
            setText(event.target.value)
            field.onChange(readSemitones(event.target.value))
          }}
        />
      )}
    </Field>
  )
}
