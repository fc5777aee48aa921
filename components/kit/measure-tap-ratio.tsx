'use client'

import { useId, useState } from 'react'
import { TapEar } from '@/components/listening/tap-ear'
import { TapsHeard } from '@/components/listening/taps-heard'
import { Button } from '@/components/ui/button'
import { LiveRegion } from '@/components/ui/live-region'
import { RadioGroup } from '@/components/ui/radio-group'
import type { NoteReader } from '@/lib/contracts/kit-form'
import type { TapReading } from '@/lib/listening/tap-report'
import { tapsTogether } from '@/lib/listening/taps-together'
import { measuredTapRatio, tapRatioErrorWords, tapRatioWords, unsureRatioWords } from '@/lib/tuning/measured-tap-ratio'

type Pitch = 'note' | 'tap'

/** A tap beside a lug lies near this over the note on common drums (derived, ported kicks apart): where to look for it. */
const USUAL_TAP_RATIO = 1.72
const names: Record<Pitch, string> = { note: 'The drum’s note', tap: 'The batter’s tap' }

export interface MeasureTapRatioProps {
  /** Where the note is looked for, Hz; null while none is set. */
  noteHz: number | null
  hasResonant: boolean
  reader: NoteReader
  /** Takes the ratio as it would be typed. */
  onUse: (ratio: string) => void
}

/** Hears the drum's note and its batter's tap, several times each, and offers the ratio of their medians. */
export function MeasureTapRatio({ noteHz, hasResonant, reader, onUse }: MeasureTapRatioProps) {
  const [open, setOpen] = useState(false)
  const panel = useId()
  return (
    <div>
      <Button aria-expanded={open} aria-controls={panel} onClick={() => setOpen(!open)}>
        {open ? 'Close the measuring' : 'Measure tap over note by the microphone'}
      </Button>
      <div id={panel}>
        {open && (
          <Measuring
            {...{ noteHz, hasResonant, reader }}
            onUse={(ratio) => {
              setOpen(false)
              onUse(ratio)
            }}
          />
        )}
      </div>
    </div>
  )
}

function Measuring({ noteHz, hasResonant, reader, onUse }: MeasureTapRatioProps) {
  const [hearing, setHearing] = useState<Pitch>('note')
  const [heard, setHeard] = useState<Record<Pitch, readonly TapReading[]>>({ note: [], tap: [] })
  const together = { note: tapsTogether(heard.note), tap: tapsTogether(heard.tap) }
  const measured = measuredTapRatio(together.tap, together.note)
  const knownNoteHz = together.note?.medianHz ?? noteHz
  const expectHz = hearing === 'note' ? noteHz : knownNoteHz && knownNoteHz * USUAL_TAP_RATIO
  return (
    <div className="mt-3 flex flex-col gap-3 border-l-4 border-line pl-4">
      <RadioGroup
        legend="What to hear"
        name="tap-ratio-pitch"
        value={hearing}
        onChange={(event) => setHearing(event.target.value === 'tap' ? 'tap' : 'note')}
        options={[
          { value: 'note', label: names.note },
          { value: 'tap', label: names.tap },
        ]}
      />
      <p className="max-w-prose text-sm text-soft">{howTo(hearing, hasResonant)}</p>
      <TapEar
        key={hearing}
        what={hearing === 'note' ? 'the drum’s note' : 'the batter’s tap'}
        ask={hearing}
        action={hearing === 'note' ? 'Listen for the note' : 'Listen for the tap'}
        kind="secondary"
        referenceHz={reader.referenceHz}
        locale={reader.locale}
        {...(expectHz === null ? {} : { expectHz })}
        onHeard={(reading) => setHeard((before) => ({ ...before, [hearing]: [...before[hearing], reading] }))}
      />
      <dl className="grid gap-x-4 border-t border-line pt-2 sm:grid-cols-[auto_minmax(0,1fr)] sm:items-center">
        {(['note', 'tap'] as const).map((pitch) => {
          const taps = together[pitch]
          return (
            <div key={pitch} className="contents">
              <dt className="text-sm max-sm:font-bold">{names[pitch]}</dt>
              <dd className="flex min-h-control flex-wrap items-center gap-x-2">
                {taps ? <TapsHeard {...taps} /> : <span className="text-sm text-soft">not heard yet</span>}
                {taps && (
                  <Button
                    kind="quiet"
                    className="max-sm:-ml-4"
                    onClick={() => setHeard((before) => ({ ...before, [pitch]: [] }))}
                  >
                    Forget {pitch === 'note' ? 'this note' : 'these taps'}
                  </Button>
                )}
              </dd>
            </div>
          )
        })}
      </dl>
      {measured.outcome === 'measured' ? (
        <div className="flex flex-wrap items-center gap-x-4 gap-y-2">
          <p className="figures">
            <strong className="text-2xl">{tapRatioWords(measured)}</strong>{' '}
            <span className="text-soft">{tapRatioErrorWords(measured)}</span>
          </p>
          <Button onClick={() => onUse(tapRatioWords(measured))}>Use {tapRatioWords(measured)}</Button>
        </div>
      ) : (
        <p className={measured.why === 'too-few' ? 'text-sm text-soft' : 'border-l-4 border-brass bg-paper px-3 py-2'}>
          {unsureRatioWords(measured.why)}
        </p>
      )}
      <LiveRegion>
        {measured.outcome === 'measured'
          ? `Tap over note ${tapRatioWords(measured)}, ${tapRatioErrorWords(measured)}.`
          : measured.why !== 'too-few' && unsureRatioWords(measured.why)}
      </LiveRegion>
    </div>
  )
}

function howTo(pitch: Pitch, hasResonant: boolean): string {
  if (pitch === 'note')
    return 'Drum in the air or on a soft stand, heads free and nothing on them. Strike the batter softly at its centre and let it ring; three times or more.'
  const damped = hasResonant ? 'Drum off its stand, the resonant head damped by a cushion, ' : 'Drum off its stand, '
  return `${damped}a fingertip on the centre of the batter. Tap beside a lug and let it ring; at three lugs or more, round the head. Move no rod between note and tap.`
}
