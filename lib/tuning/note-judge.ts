import type { Note } from '@/lib/acoustics/note'
import { intervalName } from './interval-name'
import {
  costOf,
  intervalCost,
  offAsked,
  offMiddleCost,
  orderCost,
  outOfRangeCost,
  outside,
  sharedNameCost,
  tooCloseCost,
} from './note-cost'
import { isTom, keepApart, pitchOf, planKitOf, requireNote } from './note-plan-kit'
import type { PlanKit } from './note-plan-kit'
import type {
  CostSplit,
  JudgedDrum,
  JudgedInterval,
  JudgedPlan,
  NoteOrigin,
  NotePlanInput,
  PlanClash,
  PlanDrum,
  PlanZone,
} from './note-plan-model'

/** A note for each drum, by drum id. */
export type DrumNotes = ReadonlyMap<string, Note>

/**
 * What notes set by hand cost, by the same rules as a plan. Drums without a note are left out; notes may lie anywhere, out of
 * reach too, where they only cost the more. Locks and the anchor say where a note came from and what is asked, and move nothing.
 * @throws AcousticsError whatever `planKitOf` refuses, or `semitone` or `cents` of a note
 */
export function judgePlan(input: NotePlanInput, notes: DrumNotes): JudgedPlan {
  return judgeKit(planKitOf(input), notes, 'set')
}

/** As `judgePlan`, for a kit made ready. `origin`: of the notes that are neither locked nor the anchor's. */
export function judgeKit(kit: PlanKit, notes: DrumNotes, origin: NoteOrigin): JudgedPlan {
  const sounding = (drums: readonly PlanDrum[]): SoundingDrum[] =>
    drums.flatMap((drum) => {
      const note = notes.get(drum.id)
      if (!note) return []
      requireNote(note)
      return [{ drum, note, pitch: pitchOf(note) }]
    })
  const drums = sounding(kit.drums).map((each) => judgeDrum(each, kit, origin))
  const toms = sounding(kit.toms)
  const intervals = [...tomIntervals(toms, kit), ...kickIntervals(sounding(kit.kicks), toms, kit)]
  const clashes = clashesOf(toms, sounding([...kit.kicks, ...kit.snares]), kit)
  const split = splitOf(drums, intervals, clashes)
  return { ...split, drums, intervals, clashes }
}

type SoundingDrum = { drum: PlanDrum; note: Note; pitch: number }

function judgeDrum({ drum, note, pitch }: SoundingDrum, kit: PlanKit, origin: NoteOrigin): JudgedDrum {
  return {
    ...{ drumId: drum.id, note, origin: originOf(drum, pitch, kit) ?? origin, ...placeIn(drum, pitch) },
    cost: {
      offMiddle: costOf(offMiddleCost(pitch, drum.range)),
      outOfRange: costOf(outOfRangeCost(pitch, drum.range)),
    },
  }
}

/** Where a pitch stands in a drum's range. */
function placeIn({ range: { low, middleLow, middleHigh, high } }: PlanDrum, pitch: number) {
  const [offMiddle, outOfRange] = [outside(pitch, middleLow, middleHigh), outside(pitch, low, high)]
  return { zone: zoneOf(offMiddle, outOfRange), centsOffMiddle: offMiddle * 100, centsOutOfRange: outOfRange * 100 }
}

function originOf({ id, lockedNote }: PlanDrum, pitch: number, { anchorId, fixed }: PlanKit): NoteOrigin | null {
  if (lockedNote && pitchOf(lockedNote) === pitch) return 'locked'
  const held = id === anchorId ? fixed.get(id) : undefined
  return held && pitchOf(held) === pitch ? 'anchor' : null
}

function zoneOf(offMiddle: number, outOfRange: number): PlanZone {
  if (outOfRange !== 0) return outOfRange < 0 ? 'below-range' : 'above-range'
  return offMiddle === 0 ? 'middle' : offMiddle < 0 ? 'low' : 'high'
}

function tomIntervals(toms: readonly SoundingDrum[], { asked }: PlanKit): JudgedInterval[] {
  return toms.slice(1).flatMap((lower, i) => {
    const upper = toms[i]
    if (!upper) return []
    const [from, to] = [asked.get(upper.drum.id), asked.get(lower.drum.id)]
    const exact = from && to ? to.exact - from.exact : null
    return [judgeInterval('toms', upper, lower, from && to ? [to.whole - from.whole] : [], exact)]
  })
}

/** The lowest tom, the larger of two on one note. */
function lowestOf(toms: readonly SoundingDrum[]): SoundingDrum | undefined {
  return toms.reduce<SoundingDrum | undefined>((low, tom) => (low && low.pitch < tom.pitch ? low : tom), undefined)
}

function kickIntervals(kicks: readonly SoundingDrum[], toms: readonly SoundingDrum[], { kickBelow }: PlanKit) {
  const lowest = lowestOf(toms)
  return lowest ? kicks.map((kick) => judgeInterval('kick', lowest, kick, kickBelow, null)) : []
}

function judgeInterval(
  kind: JudgedInterval['kind'],
  upper: SoundingDrum,
  lower: SoundingDrum,
  asked: readonly number[],
  askedExact: number | null,
): JudgedInterval {
  const got = upper.pitch - lower.pitch
  const nearest = [...asked].sort((a, b) => Math.abs(got - a) - Math.abs(got - b) || a - b)[0]
  return {
    ...{ kind, upperId: upper.drum.id, lowerId: lower.drum.id, asked, askedExact },
    ...{ askedName: nearest === undefined ? null : intervalName(nearest * 100), got, gotName: intervalName(got * 100) },
    offSemitones: offAsked(got, asked),
    ifAsked: nearest === undefined ? null : placeIn(lower.drum, upper.pitch - nearest),
    cost: { interval: costOf(intervalCost(got, asked)), order: costOf(orderCost(got)) },
  }
}

function clashesOf(toms: readonly SoundingDrum[], others: readonly SoundingDrum[], kit: PlanKit): PlanClash[] {
  const lowest = lowestOf(toms)
  const all = [...toms, ...others]
  return all.flatMap((one, i) =>
    all.slice(i + 1).flatMap((other, after): PlanClash[] => {
      const semitones = Math.abs(one.pitch - other.pitch)
      const drumIds = [one.drum.id, other.drum.id] as const
      const close = keepApart(one.drum, other.drum) ? tooCloseCost(semitones, kit.apartSemitones) : 0
      const charged =
        isTom(one.drum) && (isTom(other.drum) ? after === 0 : other.drum.role === 'snare' || one === lowest)
      const named = isTom(one.drum) && other.drum.role === 'snare' ? sharedNameCost(other.pitch, one.pitch) : 0
      return [
        ...(close > 0
          ? [{ kind: 'too-close', drumIds, semitones, cost: charged || !isTom(one.drum) ? costOf(close) : 0 } as const]
          : []),
        ...(named > 0
          ? [{ kind: 'shared-name', snareId: other.drum.id, tomId: one.drum.id, cost: costOf(named) } as const]
          : []),
      ]
    }),
  )
}

function splitOf(
  drums: readonly JudgedDrum[],
  intervals: readonly JudgedInterval[],
  clashes: readonly PlanClash[],
): { cost: number; split: CostSplit } {
  const split: CostSplit = {
    offMiddle: total(drums.map(({ cost }) => cost.offMiddle)),
    outOfRange: total(drums.map(({ cost }) => cost.outOfRange)),
    intervals: total(intervals.map(({ cost }) => cost.interval)),
    order: total(intervals.map(({ cost }) => cost.order)),
    tooClose: total(clashes.map(({ kind, cost }) => (kind === 'too-close' ? cost : 0))),
    sharedNames: total(clashes.map(({ kind, cost }) => (kind === 'shared-name' ? cost : 0))),
  }
  return { cost: total(Object.values(split)), split }
}

/** Costs are whole thousandths: rounding to them takes away what adding fractions leaves. */
function total(costs: readonly number[]): number {
  return Math.round(costs.reduce((sum, cost) => sum + cost, 0) * 1000) / 1000
}
