import { RangeChart } from '@/components/signature/range-chart'
import type { RangeScale } from '@/components/signature/range-bar'
import { noteFrequencyHz } from '@/lib/acoustics/note'
import { noteName } from '@/lib/acoustics/note-name'
import type { DrumEntry } from '@/lib/contracts/kit'
import { noteText } from '@/lib/contracts/kit-form'
import { intervalName } from '@/lib/tuning/interval-name'
import { playableRange } from '@/lib/tuning/playable-range'
import type { TuningStage } from '@/lib/tuning/drum-estimate'
import { hertz } from './figure-words'
import type { KitReader } from './kit-reader'
import { NoteBead } from './note-bead'

export interface NoteChartProps {
  drums: readonly DrumEntry[]
  reader: KitReader
  stage: TuningStage
  /** Null: the chart is only read. */
  onMove: ((drum: DrumEntry, semitones: number) => void) | null
}

const pitchOf = ({ spec }: DrumEntry) => spec.note && spec.note.semitone + spec.note.cents / 100

/** Every drum's playable range on one scale with its note, and the intervals from drum to drum. */
export function NoteChart({ drums, reader, stage, onMove }: NoteChartProps) {
  const ranges = drums.map((drum) => playableRange(drum.spec, stage))
  const pitches = drums.map(pitchOf).filter((pitch) => pitch !== null)
  const scale: RangeScale = {
    from: Math.floor(Math.min(...ranges.map(({ low }) => low), ...pitches)) - 1,
    to: Math.ceil(Math.max(...ranges.map(({ high }) => high), ...pitches)) + 1,
  }
  const rows = drums.map((drum, index) => {
    const { low = 0, middleLow = 0, middleHigh = 0, high = 0 } = ranges[index] ?? {}
    const at = pitchOf(drum)
    const next = drums[index + 1]
    const nextAt = next ? pitchOf(next) : null
    // Intervals tell the step from drum to drum down the toms; kick and snare stand apart.
    const steps = next && isTom(drum) && isTom(next) && at !== null && nextAt !== null
    const span = `playable ${noteName(Math.round(low), reader.locale)} to ${noteName(Math.round(high), reader.locale)}`
    const { note } = drum.spec
    const said = note
      ? `${noteText(note, reader.locale)}, ${hertz(noteFrequencyHz(note, reader.referenceHz))} Hz`
      : 'no note yet'
    return {
      ...{ id: drum.id, name: drum.name, low, middleLow, middleHigh, high },
      label: `${drum.name}: ${said}, ${span}`,
      note: note && at !== null ? { at, name: noteName(note.semitone, reader.locale) } : null,
      interval: steps ? intervalName(at - nextAt === 0 ? 0 : (at - nextAt) * 100) : null,
      bead: note && at !== null && onMove && (
        <NoteBead
          {...{ scale, at, name: noteName(note.semitone, reader.locale), valueText: said }}
          label={`Note of ${drum.name}`}
          out={at < low || at > high}
          onMove={(semitones) => onMove(drum, semitones)}
        />
      ),
    }
  })
  return <RangeChart scale={scale} rows={rows} marks={marksOf(scale, reader)} />
}

function isTom({ spec }: DrumEntry): boolean {
  return spec.role === 'tom' || spec.role === 'floor-tom'
}

/** F, A and C of each octave: near enough to read by, far enough apart to write. */
function marksOf({ from, to }: RangeScale, reader: KitReader) {
  return Array.from({ length: to - from + 1 }, (_, step) => from + step)
    .filter((semitone) => [0, 5, 9].includes(semitone % 12))
    .map((at) => ({ at, name: noteName(at, reader.locale), minor: at % 12 !== 0 }))
}
