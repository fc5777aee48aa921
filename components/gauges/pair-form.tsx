'use client'

import { useEffect, useState } from 'react'
import { ChoiceField } from '@/components/form/choice-field'
import { NumberField } from '@/components/form/number-field'
import { PliesField } from '@/components/form/plies-field'
import { SaveForm } from '@/components/form/save-form'
import { TextField } from '@/components/form/text-field'
import { Field } from '@/components/ui/field'
import { Select } from '@/components/ui/select'
import { gauges, useReadGaugesAgain } from '@/lib/client/gauges'
import { useSavingForm } from '@/lib/client/use-saving-form'
import type { Gauge, GaugePairInput, GaugePairRow, KnownHead } from '@/lib/contracts/gauge'
import { gaugePairInputSchema } from '@/lib/contracts/gauge'
import { filmOptions } from './film-options'
import { ListenedTap } from './listened-tap'

/** What of a head a pair keeps. */
export type PairStart = Omit<GaugePairInput, 'reading' | 'tapHz'>

const blank: PairStart = {
  ...{ diameterIn: 12, depthIn: 8, plyMils: [10], film: 'coated', coatingGPerM2: 0 },
  ...{ temperatureC: null, remark: '' },
}

const headFields = ['diameterIn', 'depthIn', 'plyMils', 'film', 'coatingGPerM2'] as const

/** "Tom 12, batter: 12×8 in, …" is remarked as "Tom 12 batter". */
const remarkOf = ({ words }: KnownHead) => words.slice(0, words.indexOf(':')).replace(/, (?=[^,]*$)/, ' ')

/** The head of the kits that a pair was read on, if it is still as the pair keeps it. */
function knownAs(pair: PairStart, heads: readonly KnownHead[]): KnownHead | undefined {
  return heads.find(
    (head) =>
      remarkOf(head) === pair.remark && headFields.every((field) => String(head[field]) === String(pair[field])),
  )
}

export interface PairFormProps {
  partyId: string
  gauge: Gauge
  heads: readonly KnownHead[]
  /** The head of the pair before: the next tuning of it needs two numbers only. */
  start: PairStart | null
  onSaved: (reading: number, next: PairStart) => void
  onClose: () => void
}

/** What the gauge read on a head and what the head sounded: one pair of a calibration. */
export function PairForm({ partyId, gauge, heads, start, onSaved, onClose }: PairFormProps) {
  const readAgain = useReadGaugesAgain(partyId)
  // A head out of a kit fills the fields below it; they hold what is sent.
  const [chosen, setChosen] = useState(() => (start && knownAs(start, heads)?.words) ?? '')
  const saving = useSavingForm<GaugePairInput, GaugePairRow>({
    schema: gaugePairInputSchema,
    start: start ?? blank,
    version: null,
    key: 'pair',
    save: ({ id, fields }) => gauges.addPair(gauge.id, id, fields),
    readCurrent: null,
    onSaved: ({ reading, diameterIn, depthIn, plyMils, film, coatingGPerM2, temperatureC, remark }) => {
      void readAgain()
      onSaved(reading, { diameterIn, depthIn, plyMils, film, coatingGPerM2, temperatureC, remark })
    },
  })
  const { form } = saving
  const { setFocus } = form
  const again = start !== null
  useEffect(() => {
    // The form that was sent is gone, and the focus with it.
    if (again) setFocus('reading')
  }, [again, setFocus])
  const take = (words: string) => {
    setChosen(words)
    const head = heads.find((known) => known.words === words)
    if (!head) return
    for (const field of headFields) form.setValue(field, head[field], { shouldDirty: true })
    form.setValue('remark', remarkOf(head), { shouldDirty: true })
  }
  return (
    <SaveForm
      saving={saving}
      label="New pair"
      action="Add this pair"
      busy="Adding the pair"
      names={{}}
      onClose={onClose}
    >
      <p className="max-w-prose text-sm text-soft">
        Drum off its stand, other head damped, a fingertip on the centre. Set the gauge down near a lug, note what it
        reads, tap there and note the pitch. Even the head first, or take the mean round it.
      </p>
      <div className="grid gap-4 sm:grid-cols-3">
        <NumberField form={form} name="reading" label="Gauge reads" hint={`${gauge.scale.min} to ${gauge.scale.max}`} />
        <NumberField form={form} name="tapHz" label="Tap" unit="Hz" hint="near a lug, other head damped" />
        <NumberField form={form} name="temperatureC" label="Temperature" unit="°C" optional />
      </div>
      <ListenedTap
        onMedian={(hz) =>
          hz === null
            ? form.resetField('tapHz')
            : form.setValue('tapHz', hz, { shouldDirty: true, shouldValidate: true })
        }
      />
      <Field label="Head" hint="Out of your kits; or write any other below.">
        {(control) => (
          <Select
            {...control}
            value={chosen}
            onChange={(event) => take(event.target.value)}
            placeholder="Another head"
            options={heads.map(({ words }) => ({ value: words, label: words }))}
          />
        )}
      </Field>
      <div className="grid grid-cols-2 gap-4 sm:grid-cols-5">
        <NumberField form={form} name="diameterIn" label="Across" unit="in" />
        <NumberField form={form} name="depthIn" label="Deep" unit="in" />
        <PliesField key={chosen} form={form} name="plyMils" />
        <ChoiceField form={form} name="film" label="Film" options={filmOptions} />
        <NumberField form={form} name="coatingGPerM2" label="Coating adds" unit="g/m²" hint="0 if not known" />
      </div>
      <TextField form={form} name="remark" label="Which head" optional hint="Such as: Tom 12 batter, a week old" />
    </SaveForm>
  )
}
