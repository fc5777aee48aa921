import { noteName } from '@/lib/acoustics/note-name'
import { WARBLE_LIMIT_HZ } from '@/lib/tuning/warble-limit'
import { piecesInOrder } from '@/plots/model/document'
import { canonicalJson } from './canonical-json'
import type { FrozenDrum, FrozenEntry, FrozenHead } from './frozen-kit'
import { entriesInOrder } from './frozen-kit'
import { cymbalSizeWords, cymbalTypeWord, drumSizeWords, headWords, typeWords } from './kit-words'
import type { Units } from './kit-words'
import { gaugeChanges } from './gauge-changes'
import type { LineContent } from './line-content'
import { insteadOfWords, linesOfKit, lineWords } from './line-content'
import { noteLocale } from './note-locale'
import type { FrozenChannel, RigSpec } from './revision-document'

export interface ChangedLine {
  readonly entryId: string
  readonly name: string
  /** Each difference in words: "12 in across, 8 deep → 13 in across, 9 deep". */
  readonly differences: readonly string[]
}

/** What differs between two states of a rig, in words that a recipient can read. */
export interface SpecChanges {
  readonly added: readonly { readonly entryId: string; readonly words: string }[]
  readonly dropped: readonly { readonly entryId: string; readonly words: string }[]
  readonly changed: readonly ChangedLine[]
  /** Notes, gauge, tolerance and the like: they ask nobody anything again, but the sheets change. */
  readonly tuning: readonly ChangedLine[]
  /** What became of the tour's gauge: the sheets' starting readings follow from it. */
  readonly gauge: readonly string[]
  readonly plot: readonly string[]
  readonly channels: readonly string[]
}

/** Compares two states of one rig; `before` null means that there was none. Lines are matched by kit entry. */
export function compareSpecs(before: RigSpec | null, after: RigSpec): SpecChanges {
  const units = after.party.units
  const was = new Map(linesOfKit(before?.kit ?? []).map((line) => [line.entryId, line.content]))
  const is = new Map(linesOfKit(after.kit).map((line) => [line.entryId, line.content]))
  return {
    added: [...is]
      .filter(([id]) => !was.has(id))
      .map(([entryId, content]) => ({ entryId, words: lineWords(content, units) })),
    dropped: [...was]
      .filter(([id]) => !is.has(id))
      .map(([entryId, content]) => ({ entryId, words: lineWords(content, units) })),
    changed: [...is].flatMap(([entryId, content]) => {
      const old = was.get(entryId)
      if (!old || canonicalJson(old) === canonicalJson(content)) return []
      return [{ entryId, name: content.name, differences: lineDifferences(old, content, units) }]
    }),
    tuning: before ? tuningChanges(before, after) : [],
    gauge: before ? gaugeChanges(before.gauge, after.gauge) : [],
    plot: before ? plotChanges(before, after) : [],
    channels: before ? channelChanges(before.channels, after.channels) : [],
  }
}

/** Whether two states of a rig ask, draw and tune exactly the same. How often the plot was touched does not count. */
export function specsAreSame(a: RigSpec, b: RigSpec): boolean {
  const meant = ({ party, tour, rig, kit, plot, channels, gauge }: RigSpec) =>
    canonicalJson({ party, tour, rig, kit: entriesInOrder(kit).map(written), plot: plot.document, channels, gauge })
  return meant(a) === meant(b)
}

/** A drum from before heads had a range and drums a measured tap ratio says the same as one that has none. */
function written(entry: FrozenEntry): FrozenEntry {
  if (entry.kind !== 'drum') return entry
  const { spec } = entry
  const head = (of: FrozenHead) => ({ ...of, range: of.range ?? null })
  const resonant = spec.resonant && head(spec.resonant)
  const measuredTapRatio = spec.measuredTapRatio ?? null
  const warbleLimitHz = spec.warbleLimitHz ?? WARBLE_LIMIT_HZ
  return { ...entry, spec: { ...spec, batter: head(spec.batter), resonant, measuredTapRatio, warbleLimitHz } }
}

/** All changes as one list of sentences, the most important first. */
export function changeSentences(changes: SpecChanges): string[] {
  return [
    ...changes.added.map(({ words }) => `New: ${words}`),
    ...changes.dropped.map(({ words }) => `No longer wanted: ${words}`),
    ...changes.changed.map(({ name, differences }) => `${name}: ${differences.join('; ')}`),
    ...changes.tuning.map(({ name, differences }) => `${name}, tuning: ${differences.join('; ')}`),
    ...changes.gauge,
    ...changes.plot,
    ...changes.channels,
  ]
}

/** What differs between two states of one line, each difference in words. */
export function lineDifferences(before: LineContent, after: LineContent, units: Units): string[] {
  if (before.kind !== after.kind) return [`${lineWords(before, units)} → ${lineWords(after, units)}`]
  const differences: string[] = []
  const say = (label: string, was: string, is: string) => {
    if (was !== is) differences.push(`${label} ${was} → ${is}`)
  }
  say('called', before.name, after.name)
  say('count', String(before.count), String(after.count))
  say('brought by', supplyWords(before.supply), supplyWords(after.supply))
  if (before.kind === 'drum' && after.kind === 'drum') {
    say('size', drumSizeWords(before.spec, units), drumSizeWords(after.spec, units))
    say('lugs', String(before.spec.lugs), String(after.spec.lugs))
    say('drum', before.spec.role.replace('-', ' '), after.spec.role.replace('-', ' '))
    say('shell', before.spec.shell || 'any', after.spec.shell || 'any')
    say('port', before.spec.ported ? 'yes' : 'no', after.spec.ported ? 'yes' : 'no')
    say('batter head', headInFull(before.spec.batter), headInFull(after.spec.batter))
    say('resonant head', headInFull(before.spec.resonant), headInFull(after.spec.resonant))
    say('instead', insteadOfWords(before) ?? 'only by asking', insteadOfWords(after) ?? 'only by asking')
  }
  if (before.kind === 'cymbal' && after.kind === 'cymbal') {
    say('cymbal', cymbalTypeWord(before.spec.type), cymbalTypeWord(after.spec.type))
    say('size', cymbalSizeWords(before.spec.diameterIn, units), cymbalSizeWords(after.spec.diameterIn, units))
  }
  if (before.kind === 'hardware' && after.kind === 'hardware') {
    say('kind', typeWords(before.spec.type), typeWords(after.spec.type))
  }
  if (before.kind === 'microphone' && after.kind === 'microphone') {
    say('kind', typeWords(before.spec.type), typeWords(after.spec.type))
    say('stand', typeWords(before.spec.stand), typeWords(after.spec.stand))
    say('phantom', before.spec.phantom ? 'yes' : 'no', after.spec.phantom ? 'yes' : 'no')
  }
  say('remark', before.remark || 'none', after.remark || 'none')
  return differences
}

function supplyWords(supply: LineContent['supply']): string {
  return supply === 'rented' ? 'the supplier' : 'the venue'
}

function headInFull(head: (Parameters<typeof headWords>[0] & { coatingGPerM2: number }) | null): string {
  if (!head) return 'none'
  return head.coatingGPerM2 > 0 ? `${headWords(head)}, coating ${head.coatingGPerM2} g/m²` : headWords(head)
}

function tuningChanges(before: RigSpec, after: RigSpec): ChangedLine[] {
  const was = new Map(before.kit.filter(isDrum).map((entry) => [entry.id, entry]))
  return entriesInOrder(after.kit)
    .filter(isDrum)
    .flatMap((entry) => {
      const old = was.get(entry.id)
      const differences = old ? tuningDifferences(old, entry, before, after) : []
      return differences.length > 0 ? [{ entryId: entry.id, name: entry.name, differences }] : []
    })
}

function isDrum(entry: FrozenEntry): entry is FrozenDrum {
  return entry.kind === 'drum'
}

function tuningDifferences(before: FrozenDrum, after: FrozenDrum, specBefore: RigSpec, specAfter: RigSpec): string[] {
  const differences: string[] = []
  const say = (label: string, was: string, is: string) => {
    if (was !== is) differences.push(`${label} ${was} → ${is}`)
  }
  const gauge = (head: { gauge: number | null } | null) => (head?.gauge == null ? 'none' : String(head.gauge))
  say('note', noteWords(before, specAfter.party.locale), noteWords(after, specAfter.party.locale))
  say('A4', `${specBefore.party.referenceHz} Hz`, `${specAfter.party.referenceHz} Hz`)
  say('resonant head over batter', `${before.spec.headRelationCents} cents`, `${after.spec.headRelationCents} cents`)
  say('measured tap over note', ratio(before), ratio(after))
  say('tolerance', `${before.spec.toleranceCents} cents`, `${after.spec.toleranceCents} cents`)
  say('warble limit', warbleWords(before), warbleWords(after))
  say('batter gauge', gauge(before.spec.batter), gauge(after.spec.batter))
  say('resonant gauge', gauge(before.spec.resonant), gauge(after.spec.resonant))
  say('batter range', rangeWords(before.spec.batter), rangeWords(after.spec.batter))
  say('resonant range', rangeWords(before.spec.resonant), rangeWords(after.spec.resonant))
  say('muffling', before.spec.muffling || 'none', after.spec.muffling || 'none')
  return differences
}

function warbleWords({ spec }: FrozenDrum): string {
  return `${spec.warbleLimitHz ?? WARBLE_LIMIT_HZ} a second`
}

function ratio({ spec }: FrozenDrum): string {
  return spec.measuredTapRatio == null ? 'not measured' : String(spec.measuredTapRatio)
}

function rangeWords(head: FrozenHead | null): string {
  return head?.range ? `${head.range.slackNPerM} to ${head.range.chokedNPerM} N/m` : 'as usual'
}

function noteWords({ spec: { note } }: FrozenDrum, locale: string): string {
  if (!note) return 'not set'
  const cents = note.cents === 0 ? '' : ` ${note.cents > 0 ? '+' : '−'}${Math.abs(note.cents)} cents`
  return `${noteName(note.semitone, noteLocale(locale))}${cents}`
}

function plotChanges(before: RigSpec, after: RigSpec): string[] {
  const was = before.plot.document
  const is = after.plot.document
  const placed = piecesInOrder(is).filter((piece) => !was.pieces[piece.id]).length
  const gone = piecesInOrder(was).filter((piece) => !is.pieces[piece.id]).length
  const moved = piecesInOrder(is).filter((piece) => {
    const old = was.pieces[piece.id]
    return old !== undefined && canonicalJson(old) !== canonicalJson(piece)
  }).length
  const stage = canonicalJson(was.stage) === canonicalJson(is.stage) ? [] : ['the stage it is drawn on']
  const parts = [
    ...(placed > 0 ? [`${placed} placed`] : []),
    ...(moved > 0 ? [`${moved} moved or changed`] : []),
    ...(gone > 0 ? [`${gone} taken off`] : []),
    ...stage,
  ]
  return parts.length > 0 ? [`Plot: ${parts.join(', ')}`] : []
}

function channelChanges(before: readonly FrozenChannel[], after: readonly FrozenChannel[]): string[] {
  const words = ({ number, name }: FrozenChannel) => `channel ${number} ${name}`
  const was = new Map(before.map((channel) => [channel.id, channel]))
  const is = new Set(after.map((channel) => channel.id))
  return [
    ...after.filter(({ id }) => !was.has(id)).map((channel) => `Patch: ${words(channel)} is new`),
    ...before.filter(({ id }) => !is.has(id)).map((channel) => `Patch: ${words(channel)} is gone`),
    ...after.flatMap((channel) => {
      const old = was.get(channel.id)
      if (!old || canonicalJson(old) === canonicalJson(channel)) return []
      return [
        words(old) === words(channel) ? `Patch: ${words(channel)} changed` : `Patch: ${words(old)} → ${words(channel)}`,
      ]
    }),
  ]
}
