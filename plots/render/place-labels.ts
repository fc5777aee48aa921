import { boundsOverlap, growBounds, type Bounds } from '../geometry/bounds'
import { footprintBounds, footprintContains, footprintsOverlap, type Footprint } from '../geometry/footprint'
import { plotPoint, type PlotPoint } from '../geometry/point'
import type { Ink, LineShape, TextRole, TextShape } from '../symbols/shape'
import { textWidthM, type TextSizes } from './text-size'

/** Words that belong to a piece, and what they are about. */
export interface LabelRequest {
  readonly pieceId: string
  readonly lines: readonly { readonly text: string; readonly role: TextRole; readonly ink: Ink }[]
  readonly footprint: Footprint
  /**
   * `inside` first if it fits, `only inside` or not at all, `beside` never inside, `corner` in the upstage stage-right
   * corner of a flat piece.
   */
  readonly prefer: 'inside' | 'only inside' | 'beside' | 'corner'
  /** Where inside, from the middle (0) to the upstage edge (1), first wish first; the middle when left out. */
  readonly shifts?: readonly number[]
  /** Low goes first and so gets its place. */
  readonly priority: number
}

export interface Obstacle {
  readonly pieceId: string
  readonly footprint: Footprint
  /** How bad it is to write over it. */
  readonly weight: number
}

export interface PlacedLabels {
  readonly texts: readonly (TextShape & { readonly pieceId: string })[]
  readonly leaders: readonly (LineShape & { readonly pieceId: string })[]
  /** Pieces whose words found no free place at all. */
  readonly unplaced: readonly string[]
  /** Boxes the words take, for tests and for what is placed after them. */
  readonly boxes: readonly Bounds[]
}

interface Candidate {
  readonly box: Bounds
  readonly lines: LabelRequest['lines']
  readonly isInside: boolean
  readonly leaderFrom: PlotPoint | null
}

const MIDDLE_FIRST = [0, 0.3, -0.3, 0.5, -0.5]
const LINE_HEIGHT_EM = 1.12
/** Steps outward when the near places are taken, in ems of a name. */
const RINGS_EM = [0.5, 1.6, 3, 4.6, 6.4]

/**
 * Finds each label a place, greedily in order of priority: words never lie over other words. Among free places it
 * takes the one over the fewest and lightest pieces, nearest first; words that stand off get a leader line.
 */
export function placeLabels(
  requests: readonly LabelRequest[],
  obstacles: readonly Obstacle[],
  sizes: TextSizes,
  taken: readonly Bounds[] = [],
): PlacedLabels {
  const boxes: Bounds[] = [...taken]
  const texts: (TextShape & { pieceId: string })[] = []
  const leaders: (LineShape & { pieceId: string })[] = []
  const unplaced: string[] = []
  const ordered = [...requests].sort((a, b) => a.priority - b.priority || (a.pieceId < b.pieceId ? -1 : 1))
  const gapM = sizes.small * 0.12
  for (const request of ordered) {
    let best: Candidate | null = null
    let bestCost = Infinity
    for (const candidate of candidatesFor(request, sizes)) {
      if (boxes.some((box) => boundsOverlap(growBounds(box, gapM), candidate.box))) continue
      const cost = costOf(candidate, request, obstacles)
      if (cost < bestCost) {
        best = candidate
        bestCost = cost
      }
      if (bestCost === 0) break
    }
    if (!best) {
      unplaced.push(request.pieceId)
      continue
    }
    boxes.push(best.box)
    texts.push(...linesIn(best, request.pieceId, sizes))
    if (best.leaderFrom) leaders.push(leaderTo(best, best.leaderFrom, request.pieceId))
  }
  return { texts, leaders, unplaced, boxes }
}

function* candidatesFor(request: LabelRequest, sizes: TextSizes): Generator<Candidate> {
  const { footprint, lines } = request
  const first = lines[0]
  if (!first) return
  const versions = lines.length > 1 ? [lines, [first]] : [lines]
  if (request.prefer === 'inside' || request.prefer === 'only inside')
    for (const version of versions)
      for (const shift of request.shifts ?? MIDDLE_FIRST) {
        const size = sizeOf(version, sizes)
        const half = (footprintBounds(footprint).maxYM - footprintBounds(footprint).minYM) / 2
        const box = boxAbout(plotPoint(footprint.centre.xM, footprint.centre.yM + shift * half), size)
        if (cornersOf(box).every((corner) => footprintContains(footprint, corner, -sizes.small * 0.25)))
          yield { box, lines: version, isInside: true, leaderFrom: null }
      }
  if (request.prefer === 'corner') {
    const bounds = footprintBounds(footprint)
    const size = sizeOf(lines, sizes)
    const pad = sizes.small * 0.6
    const inset = (left: boolean, top: boolean) =>
      boxAbout(
        plotPoint(
          left ? bounds.minXM + pad + size.widthM / 2 : bounds.maxXM - pad - size.widthM / 2,
          top ? bounds.maxYM - pad - size.heightM / 2 : bounds.minYM + pad + size.heightM / 2,
        ),
        size,
      )
    for (const [left, top] of [
      [true, true],
      [false, true],
      [true, false],
      [false, false],
    ] as const)
      yield { box: inset(left, top), lines, isInside: true, leaderFrom: null }
  }
  if (request.prefer !== 'only inside') yield* besides(request, sizes)
}

function* besides({ footprint, lines }: LabelRequest, sizes: TextSizes): Generator<Candidate> {
  const bounds = footprintBounds(footprint)
  const size = sizeOf(lines, sizes)
  const { xM, yM } = footprint.centre
  for (const [ring, away] of RINGS_EM.entries()) {
    const gap = away * sizes.name
    const right = bounds.maxXM + gap + size.widthM / 2
    const left = bounds.minXM - gap - size.widthM / 2
    const up = bounds.maxYM + gap + size.heightM / 2
    const down = bounds.minYM - gap - size.heightM / 2
    const places: [number, number][] = [
      [right, yM],
      [left, yM],
      [xM, up],
      [xM, down],
      [right, up],
      [left, up],
      [right, down],
      [left, down],
    ]
    for (const [x, y] of places)
      yield {
        box: boxAbout(plotPoint(x, y), size),
        lines,
        isInside: false,
        leaderFrom: ring === 0 ? null : footprint.centre,
      }
  }
}

function costOf(candidate: Candidate, request: LabelRequest, obstacles: readonly Obstacle[]): number {
  const label: Footprint = {
    shape: 'rect',
    centre: plotPoint((candidate.box.minXM + candidate.box.maxXM) / 2, (candidate.box.minYM + candidate.box.maxYM) / 2),
    widthM: candidate.box.maxXM - candidate.box.minXM,
    depthM: candidate.box.maxYM - candidate.box.minYM,
    rotationDeg: 0,
  }
  // Words without their second line, or away from their piece, are a little worse than whole ones close by.
  let cost = candidate.lines.length < request.lines.length ? 0.5 : 0
  if (candidate.leaderFrom) cost += 0.25
  if (request.prefer === 'inside' && !candidate.isInside) cost += 0.6
  for (const obstacle of obstacles) {
    if (obstacle.pieceId === request.pieceId) {
      if (!candidate.isInside && footprintsOverlap(label, obstacle.footprint)) cost += obstacle.weight
      continue
    }
    if (footprintsOverlap(label, obstacle.footprint)) cost += obstacle.weight
  }
  return cost
}

function sizeOf(lines: LabelRequest['lines'], sizes: TextSizes): { widthM: number; heightM: number } {
  return {
    widthM: Math.max(...lines.map((line) => textWidthM(line.text, line.role, sizes))),
    heightM: lines.reduce((sum, line) => sum + sizes[line.role] * LINE_HEIGHT_EM, 0),
  }
}

function boxAbout(centre: PlotPoint, size: { widthM: number; heightM: number }): Bounds {
  return {
    minXM: centre.xM - size.widthM / 2,
    maxXM: centre.xM + size.widthM / 2,
    minYM: centre.yM - size.heightM / 2,
    maxYM: centre.yM + size.heightM / 2,
  }
}

function cornersOf(box: Bounds): PlotPoint[] {
  return [
    plotPoint(box.minXM, box.minYM),
    plotPoint(box.maxXM, box.minYM),
    plotPoint(box.maxXM, box.maxYM),
    plotPoint(box.minXM, box.maxYM),
  ]
}

function linesIn(candidate: Candidate, pieceId: string, sizes: TextSizes): (TextShape & { pieceId: string })[] {
  const centreXM = (candidate.box.minXM + candidate.box.maxXM) / 2
  let topM = candidate.box.maxYM
  return candidate.lines.map((line) => {
    const sizeM = sizes[line.role]
    // The baseline lies about 0.83 of an em below the top of its line.
    const at = plotPoint(centreXM, topM - sizeM * 0.9)
    topM -= sizeM * LINE_HEIGHT_EM
    return { shape: 'text', ...line, at, sizeM, anchor: 'middle', rotationDeg: 0, part: 'label', pieceId }
  })
}

function leaderTo(candidate: Candidate, from: PlotPoint, pieceId: string): LineShape & { pieceId: string } {
  const { box } = candidate
  const to = plotPoint(
    Math.min(Math.max(from.xM, box.minXM), box.maxXM),
    Math.min(Math.max(from.yM, box.minYM), box.maxYM),
  )
  return { shape: 'line', from, to, part: 'leader', stroke: 'soft', weight: 'hair', pieceId }
}
