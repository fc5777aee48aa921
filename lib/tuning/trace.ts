import { requireQuantity } from '@/lib/acoustics/require-quantity'
import { AcousticsError } from '@/lib/acoustics/acoustics-error'

export type TracePoint = { x: number; y: number }

export type TraceLugInput = {
  lug: number
  /** Clockwise from the badge as seen facing the head, radians (`FacedLug.seenRad`), rising from lug to lug. */
  seenRad: number
  /** How far this lug is off, in cents or gauge units; null when it was not read. */
  deviation: number | null
}

export type TraceOptions = {
  /** Radius of the circle that stands for "exactly right". Default 1. */
  circleRadius?: number
  /** Radius added for one cent, or one gauge unit, of deviation. */
  radiusPerUnit: number
  /** The outline stays within this share of the circle's radius, inwards and outwards, 0 to 0.9. Default 0.25. */
  clampShare?: number
  /** Points between two neighbouring lugs, 1 to 64. Default 12. */
  pointsPerSpan?: number
}

export type TraceLug = TracePoint & { lug: number; deviation: number; clamped: boolean }

export type Trace = {
  circleRadius: number
  /** True when every lug was read: one segment, whose last point joins its first. */
  closed: boolean
  /** The outline in pieces; between the pieces nothing is known and nothing is drawn. */
  segments: TracePoint[][]
  /** Where each lug that was read stands on the outline. */
  lugs: TraceLug[]
  missing: number[]
}

const TURN = 2 * Math.PI

type Knot = { seenRad: number; radius: number }

/**
 * The outline of a head: a circle when it is even, pushed out where a lug is high and in where it is low.
 * It runs through every lug that was read, by a shape-preserving cubic (Fritsch and Carlson, 1980, slopes by Brodlie's
 * weighted harmonic mean), periodic in the angle: between two lugs it never leaves the span of their two readings, so it
 * shows no bump that nobody measured. Where a lug was not read there is a gap from the lug before to the lug after.
 * `x` to the right, `y` downwards, badge at the top, centre at 0, 0.
 * @throws AcousticsError fewer than 3 lugs, angles not rising within one turn, a figure outside its range
 */
export function traceOutline(lugs: readonly TraceLugInput[], options: TraceOptions): Trace {
  const circleRadius = requireQuantity('circleRadius', options.circleRadius ?? 1, { min: 1e-3, max: 1e5, unit: '' })
  const perUnit = requireQuantity('radiusPerUnit', options.radiusPerUnit, { min: 0, max: 1e5, unit: '' })
  const clampShare = requireQuantity('clampShare', options.clampShare ?? 0.25, { min: 0, max: 0.9, unit: '' })
  const points = Math.round(
    requireQuantity('pointsPerSpan', options.pointsPerSpan ?? 12, { min: 1, max: 64, unit: '' }),
  )
  requireAngles(lugs)

  const limit = clampShare * circleRadius
  const knots = lugs.map(({ seenRad, deviation }): Knot | null => {
    if (deviation === null) return null
    requireQuantity('deviation', deviation, { min: -1e6, max: 1e6, unit: '' })
    return { seenRad, radius: circleRadius + Math.max(-limit, Math.min(limit, deviation * perUnit)) }
  })
  const runs = runsOf(knots)
  return {
    circleRadius,
    closed: knots.every((knot) => knot !== null),
    segments: runs.map((run) => segment(run.knots, run.closed, points)),
    lugs: lugs.flatMap(({ lug, deviation }, i) => {
      const knot = knots[i] ?? null
      if (knot === null || deviation === null) return []
      return [{ lug, deviation, clamped: Math.abs(deviation * perUnit) > limit, ...polar(knot.seenRad, knot.radius) }]
    }),
    missing: lugs.filter(({ deviation }) => deviation === null).map(({ lug }) => lug),
  }
}

function requireAngles(lugs: readonly TraceLugInput[]): void {
  if (lugs.length < 3) throw new AcousticsError('lugs', `${lugs.length} lugs: a trace needs at least 3.`)
  lugs.forEach(({ seenRad }, i) => {
    const before = i === 0 ? Number.NEGATIVE_INFINITY : (lugs[i - 1]?.seenRad ?? Number.NaN)
    if (!Number.isFinite(seenRad) || !(seenRad > before)) {
      throw new AcousticsError('seenRad', 'Lug angles must be finite and rise from lug to lug.')
    }
  })
  if ((lugs.at(-1)?.seenRad ?? 0) - (lugs[0]?.seenRad ?? 0) >= TURN) {
    throw new AcousticsError('seenRad', 'Lug angles must lie within one turn.')
  }
}

/** Unbroken stretches of two or more read lugs, going round; angles keep rising past a whole turn. */
function runsOf(knots: readonly (Knot | null)[]): { knots: Knot[]; closed: boolean }[] {
  const firstGap = knots.indexOf(null)
  if (firstGap === -1) return [{ knots: knots.filter((knot) => knot !== null), closed: true }]
  const runs: Knot[][] = [[]]
  for (let step = 1; step < knots.length; step++) {
    const i = firstGap + step
    const knot = knots[i % knots.length] ?? null
    if (knot === null) runs.push([])
    else runs.at(-1)?.push({ ...knot, seenRad: knot.seenRad + (i >= knots.length ? TURN : 0) })
  }
  return runs.filter((run) => run.length > 1).map((run) => ({ knots: run, closed: false }))
}

function segment(knots: readonly Knot[], closed: boolean, pointsPerSpan: number): TracePoint[] {
  const first = knots[0]
  if (first === undefined) return []
  const ring = closed ? [...knots, { ...first, seenRad: first.seenRad + TURN }] : [...knots]
  const slopes = slopesOf(ring, closed)
  const points: TracePoint[] = []
  for (let i = 0; i + 1 < ring.length; i++) {
    const [from, to] = [ring[i], ring[i + 1]]
    if (from === undefined || to === undefined) continue
    for (let p = 0; p < pointsPerSpan; p++) {
      const t = p / pointsPerSpan
      const width = to.seenRad - from.seenRad
      const radius = hermite(t, from.radius, to.radius, (slopes[i] ?? 0) * width, (slopes[i + 1] ?? 0) * width)
      points.push(polar(from.seenRad + t * width, radius))
    }
  }
  const last = ring.at(-1)
  if (last !== undefined)
    points.push(closed ? { ...(points[0] ?? polar(first.seenRad, first.radius)) } : polar(last.seenRad, last.radius))
  return points
}

function slopesOf(ring: readonly Knot[], closed: boolean): number[] {
  const spans = ring.slice(1).map((to, i) => {
    const from = ring[i] ?? to
    const width = to.seenRad - from.seenRad
    return { width, slope: (to.radius - from.radius) / width }
  })
  return ring.map((_, i) => {
    const before = i > 0 ? spans[i - 1] : closed ? spans.at(-1) : undefined
    const after = i < spans.length ? spans[i] : closed ? spans[0] : undefined
    // At a loose end the outline leaves the last reading flat, as a circle would.
    if (before === undefined || after === undefined || before.slope * after.slope <= 0) return 0
    const weightBefore = 2 * after.width + before.width
    const weightAfter = after.width + 2 * before.width
    return (weightBefore + weightAfter) / (weightBefore / before.slope + weightAfter / after.slope)
  })
}

function hermite(t: number, from: number, to: number, slopeFrom: number, slopeTo: number): number {
  const rise = t * t * (3 - 2 * t)
  return from + (to - from) * rise + slopeFrom * t * (1 - t) ** 2 - slopeTo * t * t * (1 - t)
}

function polar(seenRad: number, radius: number): TracePoint {
  return { x: radius * Math.sin(seenRad), y: -radius * Math.cos(seenRad) }
}
