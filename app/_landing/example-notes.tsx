import { RangeChart } from '@/components/signature/range-chart'
import { noteName } from '@/lib/acoustics/note-name'
import { exampleDrums } from './example-kit'

const scale = { from: 22, to: 64 }
const marks = [24, 29, 33, 36, 41, 45, 48, 53, 57, 60].map((at) => ({ at, name: noteName(at), minor: at % 12 !== 0 }))
const intervalWords: Record<number, string> = {
  3: 'minor third',
  4: 'major third',
  5: 'fourth',
  7: 'fifth',
  12: 'octave',
}

/** The example kit's notes, each on its drum's own range. */
export function ExampleNotes() {
  const order = ['tom-12', 'tom-14', 'floor-16', 'kick']
  const rows = order.flatMap((id) => exampleDrums.find((drum) => drum.id === id) ?? [])
  return (
    <RangeChart
      scale={scale}
      marks={marks}
      rows={rows.map((drum, index) => {
        const next = rows[index + 1]?.note
        const steps = drum.note && next ? drum.note.semitone - next.semitone : 0
        return {
          id: drum.id,
          name: drum.name,
          ...drum.range,
          note: drum.note && { at: drum.note.semitone, name: drum.note.name },
          label: `${drum.name}: ${drum.note?.name ?? 'no note yet'}`,
          interval: intervalWords[steps] ?? null,
        }
      })}
    />
  )
}
