import type { HeadCaution } from '@/lib/acoustics/head-estimate'
import { nearestNote } from '@/lib/acoustics/note'
import { noteName } from '@/lib/acoustics/note-name'
import type { SideEstimate } from '@/lib/tuning/drum-estimate'
import { drumEstimate } from '@/lib/tuning/drum-estimate'
import { evenLugAngles, lugsFacing } from '@/lib/tuning/lug-angles'
import { lugOrder } from '@/lib/tuning/lug-order'
import type { FrozenDrum, FrozenHead } from './frozen-kit'
import type { Units } from './kit-words'
import { drumRoleWord, drumSizeWords, headWords } from './kit-words'
import { noteLocale } from './note-locale'

/** A note as it stands on a sheet: the frequency, and beside it the nearest name and what is over it. */
export interface SheetNote {
  readonly hz: number
  readonly name: string
  /** Whole cents over the named note, −50 to 50. */
  readonly cents: number
}

/** One lug as seen facing the head, on a circle of radius 1 with the badge at the top; y downwards. */
export interface SheetLug {
  readonly lug: number
  readonly x: number
  readonly y: number
  /** Its turn in the order, 1 first. */
  readonly turn: number
}

export interface SheetHead {
  readonly side: 'batter' | 'resonant'
  readonly words: string
  readonly note: SheetNote | null
  /** Pitch of a tap near a lug, with the bounds of the estimate, Hz. */
  readonly tap: { readonly hz: number; readonly lowHz: number; readonly highHz: number; readonly name: string } | null
  /** Pull on each rod, N, an estimate. */
  readonly rodPullN: number | null
  /** The drum tech's own noted reading. */
  readonly gauge: number | null
  readonly lugs: readonly SheetLug[]
  /** The order to turn them in, lug numbers. */
  readonly order: readonly number[]
  readonly cautions: readonly HeadCaution[]
  /** Why there is no figure, when there is none. */
  readonly without: string | null
}

export interface TuningSheet {
  readonly entryId: string
  readonly name: string
  readonly role: FrozenDrum['spec']['role']
  readonly diameterIn: number
  readonly depthIn: number
  readonly lugCount: number
  readonly roleWord: string
  readonly sizeWords: string
  readonly toleranceCents: number
  readonly muffling: string
  readonly relationWords: string | null
  readonly heads: readonly SheetHead[]
}

/** A drum's sheet for whoever tunes it. Every figure is an estimate of the core, as a head in the open air. */
export function tuningSheet(
  drum: FrozenDrum,
  reader: { readonly locale: string; readonly units: Units; readonly referenceHz: number },
): TuningSheet {
  const { spec } = drum
  const figures = drumEstimate(spec, { referenceHz: reader.referenceHz })
  const heads = [
    sheetHead(drum, 'batter', spec.batter, figures?.batter ?? null, reader),
    ...(spec.resonant ? [sheetHead(drum, 'resonant', spec.resonant, figures?.resonant ?? null, reader)] : []),
  ]
  return {
    entryId: drum.id,
    name: drum.name,
    role: spec.role,
    diameterIn: spec.diameterIn,
    depthIn: spec.depthIn,
    lugCount: spec.lugs,
    roleWord: drumRoleWord(spec.role),
    sizeWords: `${drumSizeWords(spec, reader.units)}, ${spec.lugs} lugs a head`,
    toleranceCents: spec.toleranceCents,
    muffling: spec.muffling,
    relationWords: spec.resonant ? relationWords(spec.headRelationCents) : null,
    heads,
  }
}

function relationWords(cents: number): string {
  if (cents === 0) return 'both heads at one pitch'
  return `resonant head ${Math.abs(cents)} cents ${cents > 0 ? 'over' : 'under'} the batter`
}

function sheetHead(
  drum: FrozenDrum,
  side: SheetHead['side'],
  head: FrozenHead,
  figures: SideEstimate | null,
  reader: { readonly locale: string; readonly referenceHz: number },
): SheetHead {
  const { spec } = drum
  const order = lugOrder(spec.lugs)
  const turns = new Map(order.map((lug, index) => [lug, index + 1]))
  const common = {
    side,
    words: headWords(head),
    gauge: head.gauge,
    order,
    lugs: lugsFacing(side, evenLugAngles(spec.lugs)).map(({ lug, x, y }) => ({ lug, x, y, turn: turns.get(lug) ?? 0 })),
  }
  const bare = { ...common, tap: null, rodPullN: null, cautions: [] }
  if (figures === null)
    return { ...bare, note: null, without: 'No note is set for this drum: tune it even and ask the drum tech.' }
  const note = sheetNote(figures.noteHz, reader)
  const { estimate } = figures
  if (estimate === null) {
    const without = 'This head cannot be estimated at this note: ask the drum tech before you bring it up.'
    return { ...bare, note, without }
  }
  return {
    ...common,
    note,
    tap: {
      hz: estimate.tapHz,
      lowHz: estimate.interval.tapLowHz,
      highHz: estimate.interval.tapHighHz,
      name: sheetNote(estimate.tapHz, reader).name,
    },
    rodPullN: estimate.rodPullN,
    cautions: estimate.cautions,
    without: null,
  }
}

function sheetNote(hz: number, reader: { readonly locale: string; readonly referenceHz: number }): SheetNote {
  const nearest = nearestNote(hz, reader.referenceHz)
  return { hz, name: noteName(nearest.semitone, noteLocale(reader.locale)), cents: Math.round(nearest.cents) || 0 }
}
