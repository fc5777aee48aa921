import { useState } from 'react'
import { Button } from '@/components/ui/button'
import { Checkbox } from '@/components/ui/checkbox'
import { Field } from '@/components/ui/field'
import { NumberInput } from '@/components/ui/number-input'
import { Select } from '@/components/ui/select'
import type { DrumEntry } from '@/lib/contracts/kit'
import type { PartyNoteTemplate } from '@/lib/contracts/note-template'
import { headRelationWords } from '@/lib/tuning/interval-name'
import type { NoteTemplate } from '@/lib/tuning/note-template'
import type { PlanChoices } from './note-session'
import { TemplateTools } from './template-tools'
import { kickWords, stepsWords } from './template-words'

export interface PlanBarProps {
  partyId: string
  /** Toms and floor toms, from which the others are stepped. */
  toms: readonly DrumEntry[]
  everybodys: readonly NoteTemplate[]
  own: readonly PartyNoteTemplate[]
  template: NoteTemplate
  choices: PlanChoices
  onChoose: (choices: Partial<PlanChoices>) => void
  /** What the stage temperature is typed as, and what is wrong with it. */
  temperature: { text: string; problem: string | null; onType: (text: string) => void }
  /** The drums whose heads' relation a plan would change. */
  headsOf: readonly string[]
  /** Null: nothing can be planned, for the reason that stands with the plans. */
  onPlan: (() => void) | null
}

const apartOptions = [
  { value: '0', label: 'as near as they fall' },
  { value: '1', label: 'a semitone apart' },
  { value: '2', label: 'a tone apart' },
  { value: '3', label: 'a minor third apart' },
  { value: '4', label: 'a major third apart' },
]

/** By which template to plan, from which drum, and what else to heed. */
export function PlanBar(props: PlanBarProps) {
  const { partyId, toms, everybodys, own, template, choices, onChoose, temperature, headsOf, onPlan } = props
  const [more, setMore] = useState(false)
  const apart = String(choices.apartSemitones)
  const apartWords = apartOptions.find(({ value }) => value === apart)?.label ?? `${apart} semitones apart`
  return (
    <div role="group" aria-label="How to plan the notes">
      <div className="grid items-start gap-x-4 gap-y-3 sm:grid-cols-2 lg:grid-cols-[1.3fr_1fr_auto]">
        <Field label="Plan by" hint={`${stepsWords(template.steps)}; ${kickWords(template.kickBelowLowestTom)}`}>
          {(control) => (
            <Select
              {...control}
              value={template.id}
              onChange={(event) => onChoose({ templateId: event.target.value })}
              options={[
                ...everybodys.map(({ id, name }) => ({ value: id, label: name })),
                ...own.map(({ id, name }) => ({ value: id, label: `${name}, the party’s own` })),
              ]}
            />
          )}
        </Field>
        <Field
          label="From"
          hint={
            choices.anchorId === null
              ? 'wherever the ranges fit best'
              : 'the anchor: it keeps its note, the others are stepped from it'
          }
        >
          {(control) => (
            <Select
              {...control}
              value={choices.anchorId ?? ''}
              onChange={(event) => onChoose({ anchorId: event.target.value || null })}
              placeholder="No anchor"
              options={toms.map(({ id, name }) => ({ value: id, label: name }))}
            />
          )}
        </Field>
        <Button disabled={!onPlan} onClick={() => onPlan?.()} className="sm:col-span-2 lg:col-span-1 lg:mt-[1.625rem]">
          Plan the notes
        </Button>
      </div>
      <div className="mt-1 flex flex-wrap items-start justify-between gap-x-6">
        <details open={more} onToggle={(event) => setMore(event.currentTarget.open)} className="min-w-0 grow basis-80">
          <summary className="flex min-h-control w-fit cursor-pointer items-center text-sm">
            <span>
              <span className="font-bold underline underline-offset-4">What else to heed</span>
              <span className="text-soft">
                : {apartWords},{' '}
                {choices.headsToo ? headRelationWords(template.resonantCents) : 'heads left as they are'},{' '}
                {temperature.text.trim() === '' || temperature.problem ? '20' : temperature.text} °C
              </span>
            </span>
          </summary>
          <div className="mt-2 grid items-start gap-x-6 gap-y-3 sm:grid-cols-2 lg:grid-cols-4">
            <Field label="Drums at least" hint="nearer ones count as a clash">
              {(control) => (
                <Select
                  {...control}
                  value={apart}
                  onChange={(event) => onChoose({ apartSemitones: Number(event.target.value) })}
                  options={apartOptions}
                />
              )}
            </Field>
            <Checkbox
              checked={choices.headsToo}
              onChange={(event) => onChoose({ headsToo: event.target.checked })}
              label="Set the heads’ relation too"
              hint={`${headRelationWords(template.resonantCents)}; ${headsOf.length === 0 ? 'the toms have it' : `another on ${headsOf.join(', ')} now`}`}
            />
            <Checkbox
              checked={choices.othersFollow}
              onChange={(event) => onChoose({ othersFollow: event.target.checked })}
              label="The others follow a moved note"
              hint="planned anew round it, locked ones left"
            />
            <Field
              label="Stage temperature"
              optional
              error={temperature.problem ?? undefined}
              hint="20 °C unless typed; ranges and figures follow it"
            >
              {(control) => (
                <NumberInput
                  {...control}
                  unit="°C"
                  value={temperature.text}
                  onChange={(event) => temperature.onType(event.target.value)}
                />
              )}
            </Field>
          </div>
        </details>
        <TemplateTools {...{ partyId, own, chosen: template, onChoose: (templateId) => onChoose({ templateId }) }} />
      </div>
    </div>
  )
}
