import { useFormContext, useWatch } from 'react-hook-form'
import { Checkbox } from '@/components/ui/checkbox'
import { drumRoles, drumRoleWords, lugCounts } from '@/lib/contracts/kit'
import { noteFrequencyHz } from '@/lib/acoustics/note'
import type { DrumForm, NoteReader } from '@/lib/contracts/kit-form'
import { noteValue } from '@/lib/contracts/kit-form'
import { HEAD_RELATIONS } from '@/lib/tuning/head-relation'
import { headRelationWords } from '@/lib/tuning/interval-name'
import { CommonFields } from './common-fields'
import { FormPart } from './form-part'
import { HeadFields } from './head-fields'
import { MeasureTapRatio } from './measure-tap-ratio'
import { NoteField } from './note-field'
import { SizeField } from './size-field'
import { TextField } from './text-field'

const roleOptions = drumRoles.map((role) => ({ value: role, label: drumRoleWords[role] }))
const relationStarts = HEAD_RELATIONS.map(({ resonantCents }) => String(resonantCents).replace('-', '−')).join(', ')
const lugOptions = lugCounts.map((count) => ({ value: String(count), label: String(count) }))

/** What a relation of the taps does, where it is one of the usual ones; else its size in words. */
function relationHint(cents: number): string {
  return HEAD_RELATIONS.find(({ resonantCents }) => resonantCents === cents)?.means ?? headRelationWords(cents)
}

/** Everything a drum is described by. */
export function DrumFields({ reader }: { reader: NoteReader }) {
  const { register, setValue, setFocus } = useFormContext<DrumForm>()
  const [role, hasResonant, takesOther, relation, note] = useWatch<
    DrumForm,
    ['spec.role', 'hasResonant', 'takesOther', 'spec.headRelationCents', 'spec.note']
  >({ name: ['spec.role', 'hasResonant', 'takesOther', 'spec.headRelationCents', 'spec.note'] })
  const cents = Number(relation.trim().replace(',', '.').replace('−', '-'))
  const typed = noteValue(note, reader)
  const noteHz = 'value' in typed && typed.value ? noteFrequencyHz(typed.value, reader.referenceHz) : null
  const takeRatio = (ratio: string) => {
    setValue('spec.measuredTapRatio', ratio, { shouldDirty: true, shouldTouch: true, shouldValidate: true })
    setFocus('spec.measuredTapRatio')
  }
  return (
    <>
      <FormPart title="Drum">
        <div className="grid grid-cols-2 gap-x-4 gap-y-3 sm:grid-cols-4">
          <TextField path="spec.role" label="What it is" options={roleOptions} />
          <SizeField path="spec.diameterIn" label="Across" />
          <SizeField path="spec.depthIn" label="Deep" />
          <TextField path="spec.lugs" label="Lugs a head" options={lugOptions} />
        </div>
        <CommonFields>
          <TextField path="spec.shell" label="Shell" optional />
        </CommonFields>
        {role === 'kick' && <Checkbox {...register('spec.ported')} label="The front head has a port" />}
      </FormPart>
      <div className="grid gap-x-8 gap-y-5 lg:grid-cols-2">
        <FormPart title="Batter head">
          <HeadFields path="spec.batter" />
        </FormPart>
        <FormPart title="Resonant head">
          {hasResonant && <HeadFields path="spec.resonant" />}
          <Checkbox {...register('hasResonant')} label="The drum has a resonant head" />
        </FormPart>
      </div>
      <FormPart title="Tuning">
        <div className="grid grid-cols-2 gap-x-4 gap-y-3 sm:grid-cols-4">
          <NoteField path="spec.note" reader={reader} />
          <TextField
            path="spec.headRelationCents"
            label="Resonant over batter"
            unit="cents"
            hint={relation.trim() !== '' && Number.isFinite(cents) ? relationHint(cents) : relationStarts}
          />
          <TextField
            path="spec.measuredTapRatio"
            label="Tap over note, measured"
            optional
            unit=""
            hint="batter tap ÷ note, heads as they stand"
          />
          <TextField path="spec.toleranceCents" label="Even within" unit="cents" hint="how far a lug may stand off" />
          <TextField path="spec.warbleLimitHz" label="Warble under" unit="a second" hint="beats that are let pass" />
          <TextField path="spec.muffling" label="Muffling" optional />
        </div>
        <MeasureTapRatio {...{ noteHz, hasResonant, reader }} onUse={takeRatio} />
        <Checkbox
          {...register('spec.noteLocked')}
          label="Lock the note"
          hint="A template plans the other drums and leaves this one alone."
        />
      </FormPart>
      <FormPart title="Instead of this size">
        <Checkbox
          {...register('takesOther')}
          label="Another size may come without asking again"
          hint="Whoever supplies it may bring any size within this range."
        />
        {takesOther && (
          <div className="grid grid-cols-2 gap-x-4 gap-y-3 sm:grid-cols-4">
            <SizeField path="spec.insteadOf.diameterMinIn" label="Across, from" />
            <SizeField path="spec.insteadOf.diameterMaxIn" label="Across, to" />
            <SizeField path="spec.insteadOf.depthMinIn" label="Deep, from" />
            <SizeField path="spec.insteadOf.depthMaxIn" label="Deep, to" />
          </div>
        )}
      </FormPart>
    </>
  )
}
