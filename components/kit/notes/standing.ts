import { withArticle } from '@/lib/tuning/interval-name'
import type { JudgedDrum, JudgedInterval, JudgedPlan, PlanClash } from '@/lib/tuning/note-plan-model'

/** How a note stands on its drum and among the others: in a word for the chart, and in words. */
export interface Standing {
  readonly word: string
  readonly words: string
  readonly tone: 'good' | 'watch' | 'wrong'
}

export type NameOf = (drumId: string) => string

/** Nearer than this two drums sound one note to the ear, semitones. */
const sameNoteWithin = 0.5

const cents = (value: number) => `${Math.round(Math.abs(value))} cents`

function inRange({ zone, centsOffMiddle, centsOutOfRange }: JudgedDrum): Standing {
  switch (zone) {
    case 'below-range':
      return { word: 'slack', words: `${cents(centsOutOfRange)} under its range: the head goes slack`, tone: 'wrong' }
    case 'above-range':
      return { word: 'choked', words: `${cents(centsOutOfRange)} over its range: the head chokes`, tone: 'wrong' }
    case 'low':
      return { word: 'low', words: `low in its range, ${cents(centsOffMiddle)} under the middle`, tone: 'watch' }
    case 'high':
      return { word: 'high', words: `high in its range, ${cents(centsOffMiddle)} over the middle`, tone: 'watch' }
    case 'middle':
      return { word: 'middle', words: 'in the middle of its range', tone: 'good' }
  }
}

function clashing(clash: PlanClash, drumId: string, nameOf: NameOf): Standing[] {
  if (clash.kind === 'shared-name') {
    if (clash.snareId === drumId) {
      const tom = nameOf(clash.tomId)
      return [{ word: `as ${tom}`, words: `bears the note name of ${tom}, which will stir its wires`, tone: 'watch' }]
    }
    const snare = nameOf(clash.snareId)
    return clash.tomId === drumId
      ? [{ word: 'stirs wires', words: `bears the note name of ${snare} and will stir its wires`, tone: 'watch' }]
      : []
  }
  if (!clash.drumIds.includes(drumId)) return []
  const other = nameOf(clash.drumIds[0] === drumId ? clash.drumIds[1] : clash.drumIds[0])
  return clash.semitones < sameNoteWithin
    ? [{ word: `same as ${other}`, words: `sounds the same note as ${other}`, tone: 'wrong' }]
    : [{ word: `near ${other}`, words: `only ${cents(clash.semitones * 100)} from ${other}`, tone: 'watch' }]
}

function outOfOrder({ upperId, lowerId, got }: JudgedInterval, drumId: string, nameOf: NameOf): Standing[] {
  return got < 0 && lowerId === drumId
    ? [{ word: `over ${nameOf(upperId)}`, words: `sounds above ${nameOf(upperId)}, the smaller drum`, tone: 'wrong' }]
    : []
}

const toneOrder = { wrong: 0, watch: 1, good: 2 }

/** Everything there is to say of one drum of a plan, the gravest first; a drum without a note has nothing. */
export function standingsOf(plan: JudgedPlan | null, drumId: string, nameOf: NameOf): Standing[] {
  const drum = plan?.drums.find((each) => each.drumId === drumId)
  if (!plan || !drum) return []
  return [
    inRange(drum),
    ...plan.clashes.flatMap((clash) => clashing(clash, drumId, nameOf)),
    ...plan.intervals.flatMap((interval) => outOfOrder(interval, drumId, nameOf)),
  ].sort((a, b) => toneOrder[a.tone] - toneOrder[b.tone])
}

/** An interval as it is, and what it should have been ("major third for a fourth"). */
export function intervalWords({ gotName, askedName, offSemitones }: JudgedInterval): string {
  return offSemitones > 0 && askedName ? `${gotName}, not ${withArticle(askedName)}` : gotName
}
