import type { ReactNode } from 'react'
import type { CostStep } from '@/components/signature/cost-steps'
import type { RangeScale } from '@/components/signature/range-bar'
import { RangeChart } from '@/components/signature/range-chart'
import { classes } from '@/components/ui/classes'
import type { Note } from '@/lib/acoustics/note'
import { noteName } from '@/lib/acoustics/note-name'
import type { DrumEntry } from '@/lib/contracts/kit'
import type { JudgedPlan, PlanDrum } from '@/lib/tuning/note-plan-model'
import type { KitReader } from '../kit-reader'
import type { NoteMove } from './note-bead'
import { FirstNote } from './first-note'
import { NoteBead } from './note-bead'
import { pitchOf } from './note-draft'
import { spokenNote } from './spoken-note'
import { intervalWords, standingsOf } from './standing'
import type { Standing } from './standing'

export interface NoteChartProps {
  drums: readonly DrumEntry[]
  /** The drums with their ranges, in the same order. */
  ranged: readonly PlanDrum[]
  judged: JudgedPlan | null
  scale: RangeScale
  reader: KitReader
  /** Notes to compare with, drawn as rings: the kit's, or the plan's while another is looked at. */
  compare: ReadonlyMap<string, number>
  anchorId: string | null
  chosenId: string | null
  costs: readonly CostStep[] | null
  /** Null: the chart is only read. */
  hands: {
    choose: (drum: DrumEntry) => void
    move: (drum: DrumEntry, move: NoteMove) => void
    slide: (drum: DrumEntry, move: NoteMove) => void
    putDown: (drum: DrumEntry) => void
    /** Gives a drum its first note. */
    give: (drum: DrumEntry, note: Note) => void
    letGo: () => void
  } | null
}

/** Every drum's playable range on one scale with its note, the intervals from drum to drum, and how each note stands. */
export function NoteChart(props: NoteChartProps) {
  const { drums, ranged, judged, scale, reader, compare, anchorId, chosenId, costs, hands } = props
  const nameOf = (id: string) => drums.find((drum) => drum.id === id)?.name ?? 'another drum'
  const rows = drums.map((drum, index) => {
    const range = ranged[index]?.range ?? { low: 0, middleLow: 0, middleHigh: 0, high: 0 }
    const { note } = drum.spec
    const next = drums[index + 1]
    const interval = judged?.intervals.find(({ upperId, lowerId }) => upperId === drum.id && lowerId === next?.id)
    const standings = standingsOf(judged, drum.id, nameOf)
    const said = note ? spokenNote(note, reader) : 'no note yet'
    const stands = standings.map(({ words }) => words).join(', ')
    const span = `playable ${noteName(Math.round(range.low), reader.locale)} to ${noteName(Math.round(range.high), reader.locale)}`
    const held = [drum.spec.noteLocked && 'locked', drum.id === anchorId && 'the anchor'].filter(Boolean).join(', ')
    const at = note && pitchOf(note)
    const name = note ? beadName(note.cents, noteName(note.semitone, reader.locale)) : ''
    return {
      ...{ id: drum.id, name: drum.name, ...range, ghost: compare.get(drum.id) ?? null },
      label: [`${drum.name}: ${said}`, stands, held, span].filter(Boolean).join(', '),
      note: at === null ? null : { at, name },
      interval: interval ? intervalWords(interval) : null,
      intervalOff: (interval?.offSemitones ?? 0) > 0,
      standing: <RowStanding standing={standings[0] ?? null} held={held} />,
      costs: drum.id === chosenId ? costs : null,
      bead:
        hands &&
        (at === null ? (
          <FirstNote
            at={(range.middleLow + range.middleHigh) / 2}
            {...{ scale, drumName: drum.name }}
            onGive={(to) => hands.give(drum, { semitone: Math.round(to), cents: 0 })}
          />
        ) : (
          <NoteBead
            {...{ scale, at, name, low: range.low, high: range.high }}
            label={`Note of ${drum.name}`}
            valueText={[said, stands].filter(Boolean).join(', ')}
            chosen={drum.id === chosenId}
            onChoose={() => hands.choose(drum)}
            onMove={(move) => hands.move(drum, move)}
            onSlide={(move) => hands.slide(drum, move)}
            onPutDown={() => hands.putDown(drum)}
            onLetGo={hands.letGo}
          />
        )),
    }
  })
  return <RangeChart scale={scale} rows={rows} marks={marksOf(scale, reader)} />
}

const toneClasses: Record<Standing['tone'], string> = {
  good: 'text-reed',
  watch: 'text-brass',
  wrong: 'font-bold text-spike-text',
}

function RowStanding({ standing, held }: { standing: Standing | null; held: string }): ReactNode {
  return (
    <span className="text-[0.75rem] leading-tight text-soft">
      {standing && <span className={classes(toneClasses[standing.tone])}>{standing.word}</span>}
      {standing && held && ', '}
      {held}
    </span>
  )
}

/** A bead has room for a name; cents are told by a sign and said in full below the chart. */
function beadName(cents: number, name: string): string {
  return cents === 0 ? name : `${name}${cents > 0 ? '+' : '−'}`
}

/** F, A and C of each octave: near enough to read by, far enough apart to write. */
function marksOf({ from, to }: RangeScale, reader: KitReader) {
  return Array.from({ length: to - from + 1 }, (_, step) => from + step)
    .filter((semitone) => [0, 5, 9].includes(semitone % 12))
    .map((at) => ({ at, name: noteName(at, reader.locale), minor: at % 12 !== 0 }))
}
