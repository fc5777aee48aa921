import { footprintBounds, type CircleFootprint, type Footprint } from './footprint'
import { distanceM, plotPoint, type PlotPoint } from './point'
import { tangentCentre, tangentCentresOfTwo } from './tangent'

/** A line or a touch that explains a snap, for the editor to draw. Coordinates in metres. */
export type SnapGuide =
  | { readonly kind: 'upright'; readonly xM: number; readonly why: 'centre line' | 'centre' | 'edge' }
  | { readonly kind: 'level'; readonly yM: number; readonly why: 'downstage edge' | 'centre' | 'edge' }
  | { readonly kind: 'touch'; readonly centre: PlotPoint; readonly radiusM: number; readonly why: 'touching' }

/** Where the piece goes, and what held it there (empty when nothing is near or only the grid took it). */
export interface Snap {
  readonly point: PlotPoint
  readonly guides: readonly SnapGuide[]
}

export interface SnapInput {
  /** The moving piece as it would stand unsnapped. */
  readonly moving: Footprint
  readonly others: readonly Footprint[]
  /** Grid step in metres, or null for no grid. */
  readonly gridM: number | null
  /** How near a snap has to be to take hold, in metres. */
  readonly reachM: number
}

interface AxisSnap {
  readonly valueM: number
  readonly offByM: number
  readonly rank: number
  readonly guide: SnapGuide | null
}

/**
 * Snaps a moving piece. Touching two round pieces wins over touching one, and both over lining up; on each axis the
 * centre line, then others' centres and edges, win over the grid. Pure: the same input always gives the same place.
 */
export function snapMove(input: SnapInput): Snap {
  const touch = touchSnap(input)
  if (touch) return touch
  const { centre } = input.moving
  const x = axisSnap(centre.xM, uprights(input), input)
  const y = axisSnap(centre.yM, levels(input), input)
  return {
    point: plotPoint(x?.valueM ?? centre.xM, y?.valueM ?? centre.yM),
    guides: [x?.guide, y?.guide].filter((guide) => guide != null),
  }
}

function touchSnap({ moving, others, reachM }: SnapInput): Snap | null {
  if (moving.shape !== 'circle') return null
  const near = others.filter(
    (other): other is CircleFootprint =>
      other.shape === 'circle' &&
      Math.abs(distanceM(other.centre, moving.centre) - other.radiusM - moving.radiusM) <= reachM * 2,
  )
  const pairs = near.flatMap((a, index) =>
    near
      .slice(index + 1)
      .flatMap((b) =>
        tangentCentresOfTwo(a, b, moving.radiusM).map((point) => ({ point, guides: [touchGuide(a), touchGuide(b)] })),
      ),
  )
  const singles = near.map((other) => ({
    point: tangentCentre(other, moving.radiusM, moving.centre),
    guides: [touchGuide(other)],
  }))
  return nearest(pairs, moving.centre, reachM) ?? nearest(singles, moving.centre, reachM)
}

function touchGuide(circle: CircleFootprint): SnapGuide {
  return { kind: 'touch', centre: circle.centre, radiusM: circle.radiusM, why: 'touching' }
}

function nearest(snaps: readonly Snap[], from: PlotPoint, reachM: number): Snap | null {
  let best: Snap | null = null
  let bestM = reachM
  for (const snap of snaps) {
    const awayM = distanceM(snap.point, from)
    if (awayM <= bestM) {
      best = snap
      bestM = awayM
    }
  }
  return best
}

function uprights({ moving, others }: SnapInput): AxisSnap[] {
  const at = moving.centre.xM
  const box = footprintBounds(moving)
  const make = (valueM: number, rank: number, guide: SnapGuide): AxisSnap => ({
    valueM,
    offByM: Math.abs(valueM - at),
    rank,
    guide,
  })
  const snaps = [make(0, 0, { kind: 'upright', xM: 0, why: 'centre line' })]
  for (const other of others) {
    const theirs = footprintBounds(other)
    snaps.push(make(other.centre.xM, 1, { kind: 'upright', xM: other.centre.xM, why: 'centre' }))
    for (const edge of [theirs.minXM, theirs.maxXM]) {
      snaps.push(make(at + edge - box.minXM, 2, { kind: 'upright', xM: edge, why: 'edge' }))
      snaps.push(make(at + edge - box.maxXM, 2, { kind: 'upright', xM: edge, why: 'edge' }))
    }
  }
  return snaps
}

function levels({ moving, others }: SnapInput): AxisSnap[] {
  const at = moving.centre.yM
  const box = footprintBounds(moving)
  const make = (valueM: number, rank: number, guide: SnapGuide): AxisSnap => ({
    valueM,
    offByM: Math.abs(valueM - at),
    rank,
    guide,
  })
  const snaps = [make(at - box.minYM, 0, { kind: 'level', yM: 0, why: 'downstage edge' })]
  for (const other of others) {
    const theirs = footprintBounds(other)
    snaps.push(make(other.centre.yM, 1, { kind: 'level', yM: other.centre.yM, why: 'centre' }))
    for (const edge of [theirs.minYM, theirs.maxYM]) {
      snaps.push(make(at + edge - box.minYM, 2, { kind: 'level', yM: edge, why: 'edge' }))
      snaps.push(make(at + edge - box.maxYM, 2, { kind: 'level', yM: edge, why: 'edge' }))
    }
  }
  return snaps
}

function axisSnap(atM: number, snaps: readonly AxisSnap[], { gridM, reachM }: SnapInput): AxisSnap | null {
  const held = snaps
    .filter((snap) => snap.offByM <= reachM)
    .sort((a, b) => a.rank - b.rank || a.offByM - b.offByM || a.valueM - b.valueM)[0]
  if (held) return held
  if (gridM === null) return null
  const valueM = Math.round(atM / gridM) * gridM
  return { valueM, offByM: Math.abs(valueM - atM), rank: 3, guide: null }
}
