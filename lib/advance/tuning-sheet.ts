import type { DrumTuning, DrumTuningInput } from '@/lib/acoustics/drum-tuning'
import type { Estimated } from '@/lib/acoustics/estimated'
import type { HeadCaution } from '@/lib/acoustics/head-cautions'
import { nearestNote } from '@/lib/acoustics/note'
import { noteName } from '@/lib/acoustics/note-name'
import type { DrumEstimate } from '@/lib/tuning/drum-estimate'
import { drumEstimate } from '@/lib/tuning/drum-estimate'
import type { GaugeCalibration } from '@/lib/tuning/gauge-calibration'
import { gaugeOfHead } from '@/lib/tuning/gauge-of-head'
import { outsideWords, startingBounds, startingWords } from '@/lib/tuning/gauge-words'
import { evenLugAngles, lugsFacing } from '@/lib/tuning/lug-angles'
import { lugOrder } from '@/lib/tuning/lug-order'
import { WARBLE_LIMIT_HZ } from '@/lib/tuning/warble-limit'
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

/** An estimated pitch, its bounds, and the name nearest to it. */
export interface SheetPitch {
  readonly hz: number
  readonly lowHz: number
  readonly highHz: number
  readonly name: string
}

/** What belongs to the drum and not to one head. */
export interface SheetFigures {
  readonly model: DrumTuning['model']
  /** Batter tap over the drum's note. */
  readonly tapRatio: Estimated
  readonly tapRatioMeasured: boolean
  /** The heads against each other; null for one head, like the two after it. */
  readonly upperPartner: SheetPitch | null
  /** Share of the note that the heads pass to each other, 1 when they match; no seconds. */
  readonly sustain: number | null
  /** Warble feigned by the other head when it is not damped, Hz. */
  readonly falseWarbleHz: number | null
}

/** One lug as seen facing the head, on a circle of radius 1 with the badge at the top; y downwards. */
export interface SheetLug {
  readonly lug: number
  readonly x: number
  readonly y: number
  /** Its turn in the order, 1 first. */
  readonly turn: number
}

/** A gauge's starting reading: foretold by the tour's calibrated gauge, or as the drum tech noted it, relative to that gauge. */
export type SheetGauge =
  | {
      readonly kind: 'foretold'
      /** Which gauge it holds for. */
      readonly gauge: string
      readonly reading: string
      /** Null outside the calibrated range, where `outside` says why. */
      readonly bounds: string | null
      readonly outside: string | null
    }
  | { readonly kind: 'noted'; readonly reading: string }

export interface SheetHead {
  readonly side: 'batter' | 'resonant'
  readonly words: string
  /** The drum's note: both heads sound it together. */
  readonly note: SheetNote | null
  /** Pitch of a tap near a lug, the other head damped, with the bounds of the estimate. */
  readonly tap: SheetPitch | null
  /** Film tension, N/m, an estimate. */
  readonly tensionNPerM: Estimated | null
  /** Pull on each rod, N, an estimate, and its bounds. */
  readonly rodPullN: number | null
  readonly rodPullBoundsN: Omit<Estimated, 'value'> | null
  /** What a gauge should read to start from; null when none was noted and none is calibrated. */
  readonly gauge: SheetGauge | null
  /** How far a tap may stand from its pitch and still be even, Hz; null without a tap. */
  readonly toleranceHz: number | null
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
  /** Warble that is let pass, beats a second. */
  readonly warbleLimitHz: number
  readonly muffling: string
  readonly relationWords: string | null
  /** The drum's one note. */
  readonly note: SheetNote | null
  /** Null without a note, when the drum cannot sound it, and in packs from before they were worked out. */
  readonly figures: SheetFigures | null
  /** What the figures were worked out from, for whoever asks why; null where they are. */
  readonly workedFrom: DrumTuningInput | null
  readonly heads: readonly SheetHead[]
}

export interface SheetReader {
  readonly locale: string
  readonly units: Units
  readonly referenceHz: number
  /** The tour's gauge, calibrated; null where there is none. */
  readonly calibration: GaugeCalibration | null
}

/** A drum's sheet for whoever tunes it. Every figure is an estimate of the core, both heads worked out together. */
export function tuningSheet(drum: FrozenDrum, reader: SheetReader): TuningSheet {
  const { spec } = drum
  const estimate = drumEstimate(spec, { referenceHz: reader.referenceHz })
  const note = estimate && sheetNote(estimate.noteHz, reader)
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
    warbleLimitHz: spec.warbleLimitHz ?? WARBLE_LIMIT_HZ,
    muffling: spec.muffling,
    relationWords: spec.resonant && !spec.ported ? relationWords(spec.headRelationCents) : null,
    note,
    figures: estimate?.tuning ? sheetFigures(estimate.tuning, reader) : null,
    workedFrom: estimate?.tuning ? estimate.input : null,
    heads: [
      sheetHead(drum, 'batter', spec.batter, estimate, reader),
      ...(spec.resonant ? [sheetHead(drum, 'resonant', spec.resonant, estimate, reader)] : []),
    ],
  }
}

function sheetFigures(tuning: DrumTuning, reader: SheetReader): SheetFigures {
  const { model, tapRatio, tapRatioMeasured, upperPartnerHz, sustain, falseWarbleHz } = tuning
  const upperPartner = upperPartnerHz && sheetPitch(upperPartnerHz, reader)
  return { model, tapRatio, tapRatioMeasured, upperPartner, sustain, falseWarbleHz }
}

function relationWords(cents: number): string {
  if (cents === 0) return 'both heads at one tap pitch'
  return `resonant tap ${Math.abs(cents)} cents ${cents > 0 ? 'over' : 'under'} the batter’s`
}

function sheetHead(
  drum: FrozenDrum,
  side: SheetHead['side'],
  head: FrozenHead,
  estimate: DrumEstimate | null,
  reader: SheetReader,
): SheetHead {
  const { spec } = drum
  const order = lugOrder(spec.lugs)
  const turns = new Map(order.map((lug, index) => [lug, index + 1]))
  const common = {
    side,
    words: headWords(head),
    note: estimate && sheetNote(estimate.noteHz, reader),
    gauge: sheetGauge(spec, head, estimate?.tuning?.[side]?.tapHz.value ?? null, reader.calibration),
    order,
    lugs: lugsFacing(side, evenLugAngles(spec.lugs)).map(({ lug, x, y }) => ({ lug, x, y, turn: turns.get(lug) ?? 0 })),
  }
  const figures = estimate?.tuning?.[side]
  if (!figures) {
    const without = withoutWords(estimate)
    const none = { tap: null, toleranceHz: null, tensionNPerM: null, rodPullN: null, rodPullBoundsN: null }
    return { ...common, ...none, cautions: [], without }
  }
  const { value, low, high } = figures.rodPullN
  return {
    ...common,
    tap: sheetPitch(figures.tapHz, reader),
    toleranceHz: figures.tapHz.value * (2 ** (spec.toleranceCents / 1200) - 1),
    tensionNPerM: figures.tensionNPerM,
    rodPullN: value,
    rodPullBoundsN: { low, high },
    cautions: figures.cautions,
    without: null,
  }
}

function sheetGauge(
  { diameterIn, depthIn, ported, resonant }: FrozenDrum['spec'],
  { plyMils, coatingGPerM2, gauge: noted }: FrozenHead,
  tapHz: number | null,
  calibration: GaugeCalibration | null,
): SheetGauge | null {
  const openShell = ported || resonant === null
  const found = gaugeOfHead(calibration, { diameterIn, depthIn, plyMils, coatingGPerM2, openShell }, { tapHz, noted })
  if (found === null) return null
  if (found.kind === 'noted') return { kind: 'noted', reading: String(found.reading) }
  const { gauge, scale, start } = found
  return {
    ...{ kind: 'foretold', gauge, reading: startingWords(start, scale), bounds: startingBounds(start, scale) },
    outside: start.outside && outsideWords[start.outside],
  }
}

/** Why a head has no figures. */
function withoutWords(estimate: DrumEstimate | null): string {
  if (!estimate) return 'No note is set for this drum: tune it even and ask the drum tech.'
  if (!estimate.tuning) return 'This drum cannot be estimated at this note: ask the drum tech before you bring it up.'
  return 'This head has a port: there is no figure for it. Tune it even, by ear.'
}

function sheetPitch({ value, low, high }: Estimated, reader: SheetReader): SheetPitch {
  return { hz: value, lowHz: low, highHz: high, name: sheetNote(value, reader).name }
}

function sheetNote(hz: number, reader: SheetReader): SheetNote {
  const nearest = nearestNote(hz, reader.referenceHz)
  return { hz, name: noteName(nearest.semitone, noteLocale(reader.locale)), cents: Math.round(nearest.cents) || 0 }
}
