import type { Bench, BenchDrum, BenchHead, BenchReading } from '@/lib/contracts/bench'
import { headState } from '@/lib/tuning/head-state'
import type { HeadState, ReadingBasis } from '@/lib/tuning/head-state'
import { deviation } from '@/lib/tuning/head-state-words'
import { lugsFacing } from '@/lib/tuning/lug-angles'
import { lugOrder } from '@/lib/tuning/lug-order'
import { inOrderTaken, standingReadings } from '@/lib/tuning/readings'
import type { Reading } from '@/lib/tuning/readings'
import { traceOutline } from '@/lib/tuning/trace'
import type { Trace } from '@/lib/tuning/trace'

/** Readings of one gauge that lie this near their mean count as even (common practice). */
export const GAUGE_TOLERANCE = 1
/** How far from the circle the tolerance is drawn, as a share of its radius. */
const BAND = 0.1

export type ViewedReading = Reading & { readonly logged: BenchReading }

export type HeadView = {
  readonly basis: ReadingBasis
  readonly state: HeadState
  /** Null before the first reading. */
  readonly outline: Trace | null
  readonly bandInner: number
  readonly bandOuter: number
  readonly lugs: readonly {
    readonly number: number
    readonly angleRad: number
    readonly offset: number | null
    readonly out: boolean
  }[]
  readonly order: readonly number[]
  /** Snare beds make this side uneven on purpose: it is read, not judged. */
  readonly judged: boolean
  /** The pass that is under way, 1 first: once round the head. */
  readonly pass: number
  /** The next lug of this pass in the lug order. */
  readonly nextLug: number
  /** Lugs that were read in this pass, each with its standing reading. */
  readonly inPass: ReadonlyMap<number, BenchReading>
  /** How many readings of any basis stand. */
  readonly read: number
}

/** A head's readings as the rules take them. Cents become the pitch that was meant, so that a target changed since moves none. */
function asReading(logged: BenchReading): ViewedReading {
  const cents = logged.unit === 'cents' && logged.targetHz !== null
  return {
    ...{ id: logged.id, lug: logged.lug, method: logged.method, logged },
    value: cents ? (logged.targetHz ?? 0) * 2 ** (logged.value / 1200) : logged.value,
    unit: cents ? 'Hz' : logged.unit,
    ...(logged.strikes === null ? {} : { strikes: logged.strikes }),
    ...{ deviceId: logged.deviceId, deviceSequence: logged.deviceSequence, deviceAtMs: Date.parse(logged.deviceAt) },
    ...(logged.serverAt === null ? {} : { serverAtMs: Date.parse(logged.serverAt) }),
  }
}

export function readingsOfHead(
  readings: readonly BenchReading[],
  drum: BenchDrum,
  side: BenchHead['side'],
): ViewedReading[] {
  return readings
    .filter((reading) => reading.entryId === drum.entryId && reading.side === side && reading.lug <= drum.lugCount)
    .map(asReading)
}

/** By what a head is judged: whichever has read more of its lugs, so that one gauge reading does not hide a whole tap pass; then the latest. */
export function basisOfHead(readings: readonly ViewedReading[]): ReadingBasis {
  const standing = standingReadings(readings)
  const lugsReadBy = (basis: ReadingBasis) =>
    new Set(standing.filter(({ method }) => (method === 'gauge') === (basis === 'gauge')).map(({ lug }) => lug)).size
  const gauge = lugsReadBy('gauge')
  const tap = lugsReadBy('tap')
  if (gauge !== tap) return gauge > tap ? 'gauge' : 'tap'
  return inOrderTaken(readings).at(-1)?.method === 'gauge' ? 'gauge' : 'tap'
}

/** Everything the bench shows of one head, from what was logged. */
export function headView(
  readings: readonly BenchReading[],
  drum: BenchDrum,
  head: BenchHead,
  wanted: { readonly basis?: ReadingBasis | undefined; readonly passFrom?: number | undefined } = {},
): HeadView {
  const own = readingsOfHead(readings, drum, head.side)
  const basis = wanted.basis ?? basisOfHead(own)
  const tolerance = basis === 'gauge' ? GAUGE_TOLERANCE : drum.toleranceCents
  const state = headState({
    readings: own,
    ...{ basis, lugs: drum.lugCount, tolerance },
    ...(basis === 'tap' && head.tap ? { targetHz: head.tap.hz } : {}),
  })
  const judged = !(drum.role === 'snare' && head.side === 'resonant')
  const facing = lugsFacing(head.side, drum.lugAnglesRad)
  const lugs = facing.map(({ lug, seenRad }) => {
    const at = state.lugs[lug - 1]
    const offset = at?.reading ? deviation(at) : null
    return { number: lug, angleRad: seenRad, offset, out: judged && at?.out === true }
  })
  const order = lugOrder(drum.lugCount)
  const standing = standingReadings(own)
  const { pass, inPass } = passOf(standing, basis, drum.lugCount, wanted.passFrom ?? 1)
  return {
    ...{ basis, state, lugs, order, judged, pass, inPass },
    outline:
      state.missing.length === drum.lugCount
        ? null
        : traceOutline(
            lugs.map(({ number, angleRad, offset }) => ({ lug: number, seenRad: angleRad, deviation: offset })),
            { radiusPerUnit: BAND / tolerance },
          ),
    ...{ bandInner: 1 - BAND, bandOuter: 1 + BAND },
    nextLug: order.find((lug) => !inPass.has(lug)) ?? order[0] ?? 1,
    read: standing.length,
  }
}

/** The pass under way: the latest one, or the one after it once every lug of it was read. */
function passOf(standing: readonly ViewedReading[], basis: ReadingBasis, lugCount: number, passFrom: number) {
  const own = standing.filter(({ method }) => (method === 'gauge') === (basis === 'gauge'))
  const readIn = (pass: number) =>
    new Map(own.filter(({ logged }) => logged.pass === pass).map(({ lug, logged }) => [lug, logged]))
  const latest = own.reduce((pass, { logged }) => Math.max(pass, logged.pass), Math.max(1, passFrom))
  const inLatest = readIn(latest)
  if (inLatest.size < lugCount) return { pass: latest, inPass: inLatest }
  return { pass: latest + 1, inPass: readIn(latest + 1) }
}

/** The sign-off that stands for a drum, or undefined. */
export function standingSignOff(bench: Pick<Bench, 'signOffs'>, entryId: string) {
  const last = bench.signOffs.findLast((signOff) => signOff.entryId === entryId)
  return last?.decision === 'signed' ? last : undefined
}

/** How a head stands in a few words: "not read", "4 of 6 read", "even", "2 lugs out". */
export function headStandingWords({ state, judged }: HeadView, lugCount: number): string {
  const read = lugCount - state.missing.length
  if (read === 0) return 'not read'
  if (read < lugCount) return `${read} of ${lugCount} read`
  if (!judged) return 'all read'
  if (state.even) return 'even'
  return state.out.length === 1 ? '1 lug out' : `${state.out.length} lugs out`
}
