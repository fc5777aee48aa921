import {
  cymbalSizeWords,
  cymbalTypeWord,
  drumRoleWord,
  drumSizeWords,
  headWords,
  rangeWords,
  typeWords,
} from '@/lib/advance/kit-words'
import type { EntryInput, Head } from '@/lib/contracts/kit'
import { supplyWords } from '@/lib/contracts/kit'
import { noteText } from '@/lib/contracts/kit-form'
import { headRelationWords } from '@/lib/tuning/interval-name'
import type { KitReader } from './kit-reader'

export type Particular = { label: string; words: string }

/** Everything that an entry says, a word and its value each, in the order of its form. */
export function entryParticulars(entry: EntryInput, reader: KitReader): Particular[] {
  const rows: Particular[] = [
    { label: 'Name', words: entry.name },
    { label: 'Brought by', words: supplyWords[entry.supply] },
    { label: 'Count', words: String(entry.count) },
    ...specParticulars(entry, reader),
    { label: 'Remark', words: entry.remark },
  ]
  return rows.map(({ label, words }) => ({ label, words: words || 'none' }))
}

/** Only what differs between two states of one entry. */
export function entryDifferences(theirs: EntryInput, mine: EntryInput, reader: KitReader) {
  const wanted = new Map(entryParticulars(mine, reader).map(({ label, words }) => [label, words]))
  return entryParticulars(theirs, reader)
    .map(({ label, words }) => ({ label, theirs: words, mine: wanted.get(label) ?? 'none' }))
    .filter((row) => row.theirs !== row.mine)
}

function specParticulars(entry: EntryInput, reader: KitReader): Particular[] {
  switch (entry.kind) {
    case 'drum': {
      const { spec } = entry
      return [
        { label: 'Drum', words: drumRoleWord(spec.role) },
        { label: 'Size', words: drumSizeWords(spec, reader.units) },
        { label: 'Lugs a head', words: String(spec.lugs) },
        { label: 'Shell', words: spec.shell },
        { label: 'Port in the front head', words: spec.ported ? 'yes' : 'no' },
        ...headParticulars('Batter', spec.batter),
        ...headParticulars('Resonant', spec.resonant),
        { label: 'Note', words: spec.note ? noteText(spec.note, reader.locale) : 'no note yet' },
        { label: 'Note locked', words: spec.noteLocked ? 'yes' : 'no' },
        { label: 'Heads', words: headRelationWords(spec.headRelationCents) },
        {
          label: 'Tap over note',
          words: spec.measuredTapRatio === null ? 'not measured' : String(spec.measuredTapRatio),
        },
        { label: 'Tolerance', words: `${spec.toleranceCents} cents` },
        { label: 'Warble limit', words: `${spec.warbleLimitHz} a second` },
        { label: 'Muffling', words: spec.muffling },
        { label: 'May come instead', words: spec.insteadOf ? insteadWords(spec.insteadOf) : 'nothing else' },
      ]
    }
    case 'cymbal':
      return [
        { label: 'Cymbal', words: cymbalTypeWord(entry.spec.type) },
        { label: 'Size', words: cymbalSizeWords(entry.spec.diameterIn, reader.units) },
      ]
    case 'hardware':
      return [{ label: 'Hardware', words: typeWords(entry.spec.type) }]
    case 'microphone':
      return [
        { label: 'Microphone', words: typeWords(entry.spec.type) },
        { label: 'Phantom power', words: entry.spec.phantom ? 'yes' : 'no' },
        { label: 'Stand', words: typeWords(entry.spec.stand) },
      ]
  }
}

function headParticulars(side: string, head: Head | null): Particular[] {
  return [
    { label: `${side} head`, words: head ? headWords(head) : 'no head' },
    { label: `${side} coating`, words: head ? `${head.coatingGPerM2} g/m²` : 'none' },
    { label: `${side} gauge`, words: head?.gauge == null ? 'not noted' : String(head.gauge) },
    {
      label: `${side} range`,
      words: head?.range ? `${head.range.slackNPerM} to ${head.range.chokedNPerM} N/m` : 'as usual',
    },
  ]
}

/** What may come instead: "12 to 13 in across, 7 to 10 in deep". */
export function insteadWords(range: {
  diameterMinIn: number
  diameterMaxIn: number
  depthMinIn: number
  depthMaxIn: number
}): string {
  return `${rangeWords(range.diameterMinIn, range.diameterMaxIn)} across, ${rangeWords(range.depthMinIn, range.depthMaxIn)} deep`
}
