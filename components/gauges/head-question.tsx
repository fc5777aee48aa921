'use client'

import { Field } from '@/components/ui/field'
import { Notice } from '@/components/ui/notice'
import { NumberInput } from '@/components/ui/number-input'
import { Select } from '@/components/ui/select'
import type { KnownHead } from '@/lib/contracts/gauge'
import type { GaugeCalibration } from '@/lib/tuning/gauge-calibration'
import type { StartingGauge } from '@/lib/tuning/gauge-prediction'
import type { GaugeHead } from '@/lib/tuning/gauge-profile'
import { outsideWords, startingBounds, startingWords } from '@/lib/tuning/gauge-words'
import type { HeadChoice } from './head-choice'
import { OtherFilms } from './other-films'

export interface HeadQuestionProps {
  calibration: GaugeCalibration
  heads: readonly KnownHead[]
  choice: HeadChoice
  onChoice: (choice: HeadChoice) => void
  tap: string
  onTap: (tap: string) => void
  /** The head as it is understood; null while what is typed makes none. */
  head: { words: string; head: GaugeHead } | null
  answer: { start: StartingGauge; fault: null } | { start: null; fault: string } | null
}

/** What the gauge should read on a head that shall sound so high. */
export function HeadQuestion(props: HeadQuestionProps) {
  const { calibration, heads, choice, onChoice, tap, onTap, head, answer } = props
  const typed = (field: 'diameterIn' | 'depthIn' | 'plyMils', label: string, unit: string) => (
    <Field label={label}>
      {(control) => (
        <NumberInput
          {...control}
          unit={unit}
          inputMode={field === 'plyMils' ? 'text' : 'decimal'}
          value={choice[field]}
          onChange={(event) => onChoice({ ...choice, [field]: event.target.value })}
        />
      )}
    </Field>
  )
  return (
    <section aria-labelledby="question" className="mt-10">
      <h2 id="question" className="text-2xl">
        What it should read
      </h2>
      <div className="mt-3 grid items-start gap-4 sm:grid-cols-[minmax(0,1fr)_12rem]">
        <Field label="Head">
          {(control) => (
            <Select
              {...control}
              value={choice.known}
              onChange={(event) => onChoice({ ...choice, known: event.target.value })}
              placeholder="Another head"
              options={heads.map(({ words }) => ({ value: words, label: words }))}
            />
          )}
        </Field>
        <Field label="Tap wanted" hint="near a lug, other head damped" error={answer?.fault ?? undefined}>
          {(control) => (
            <NumberInput {...control} unit="Hz" value={tap} onChange={(event) => onTap(event.target.value)} />
          )}
        </Field>
      </div>
      {choice.known === '' && (
        <div className="mt-3 grid max-w-lg grid-cols-3 gap-4">
          {typed('diameterIn', 'Across', 'in')}
          {typed('depthIn', 'Deep', 'in')}
          {typed('plyMils', 'Plies', 'mil')}
        </div>
      )}
      {!head && (
        <p className="mt-3 text-soft">
          Write the head’s size and plies: 6 to 28 in across, 3 to 24 in deep, such as 10 or 7 + 7 mil.
        </p>
      )}
      <div aria-live="polite">{head && answer?.start && <Answer calibration={calibration} start={answer.start} />}</div>
      {head && answer?.start && answer.start.outside === null && (
        <OtherFilms calibration={calibration} head={head.head} reading={answer.start.reading} />
      )}
    </section>
  )
}

function Answer({ calibration: { scale, name }, start }: { calibration: GaugeCalibration; start: StartingGauge }) {
  const bounds = startingBounds(start, scale)
  return (
    <div className="mt-4">
      <p className="flex flex-wrap items-baseline gap-x-4">
        <span className="sr-only">{name} should read </span>
        <span className="figures text-5xl font-bold">{startingWords(start, scale)}</span>
        {bounds && (
          <span>
            <span className="figures font-bold">{bounds}</span>, nine readings in ten
          </span>
        )}
        <span className="figures text-soft">{(start.tensionNPerM / 1000).toFixed(2)} kN/m</span>
      </p>
      {start.outside && (
        <Notice kind="wait" word="Outside" className="mt-2">
          {outsideWords[start.outside]} Read such a head and add the pair.
        </Notice>
      )}
    </div>
  )
}
