import { plotPoint } from '../geometry/point'
import { boxShape, type Shape } from './shape'

/** Drawings of the pieces that are not in the kit, each about its own middle and facing the audience. */

export function riser(widthM: number, depthM: number): Shape[] {
  return [boxShape(widthM, depthM, 'riser', { stroke: 'ink', weight: 'fine', dash: 'dashed' })]
}

export function rug(widthM: number, depthM: number): Shape[] {
  return [boxShape(widthM, depthM, 'rug', { stroke: 'line', fill: 'wash', weight: 'fine' })]
}

/** The sloping face of a wedge is towards its player: its narrow edge faces upstage when it stands at rest. */
export function wedge(widthM: number, depthM: number): Shape[] {
  const w = widthM / 2
  const d = depthM / 2
  return [
    {
      shape: 'polygon',
      points: [plotPoint(-w, -d), plotPoint(w, -d), plotPoint(w * 0.72, d), plotPoint(-w * 0.72, d)],
      part: 'wedge',
      stroke: 'ink',
      fill: 'wash',
      weight: 'fine',
    },
  ]
}

/** A box with a second line along its front, the side that faces the audience at rest. */
export function frontedBox(widthM: number, depthM: number, part: string): Shape[] {
  const front = -depthM / 2 + Math.min(0.04, depthM / 5)
  return [
    boxShape(widthM, depthM, part, { stroke: 'ink', fill: 'sheet', weight: 'fine' }),
    {
      shape: 'line',
      from: plotPoint(-widthM / 2, front),
      to: plotPoint(widthM / 2, front),
      part: 'front',
      stroke: 'ink',
      weight: 'hair',
    },
  ]
}

/** A keyboard: its keys lie towards the player, upstage at rest. */
export function keys(widthM: number, depthM: number): Shape[] {
  const edge = depthM * 0.1
  return [
    boxShape(widthM, depthM, 'keys', { stroke: 'ink', fill: 'sheet', weight: 'fine' }),
    {
      shape: 'line',
      from: plotPoint(-widthM / 2, edge),
      to: plotPoint(widthM / 2, edge),
      part: 'front',
      stroke: 'ink',
      weight: 'hair',
    },
  ]
}

export function seat(diameterM: number): Shape[] {
  return [
    {
      shape: 'circle',
      centre: plotPoint(0, 0),
      radiusM: diameterM / 2,
      part: 'seat',
      stroke: 'ink',
      fill: 'wash',
      weight: 'fine',
    },
  ]
}

/** A person from above: shoulders, and a tick towards where they look. */
export function person(diameterM: number): Shape[] {
  const r = diameterM / 2
  return [
    {
      shape: 'circle',
      centre: plotPoint(0, 0),
      radiusM: r,
      part: 'person',
      stroke: 'ink',
      fill: 'sheet',
      weight: 'fine',
    },
    { shape: 'line', from: plotPoint(0, -r), to: plotPoint(0, -r - 0.08), part: 'face', stroke: 'ink', weight: 'bold' },
  ]
}

/** A spread stand: three feet from the middle, one towards the audience. */
export function stand(diameterM: number): Shape[] {
  const r = diameterM / 2
  return [0, 120, 240].map((deg): Shape => {
    const angle = (deg * Math.PI) / 180
    return {
      shape: 'line',
      from: plotPoint(0, 0),
      to: plotPoint(-Math.sin(angle) * r, -Math.cos(angle) * r),
      part: 'foot',
      stroke: 'soft',
      weight: 'fine',
    }
  })
}

/** What is drawn for a kind of a newer release, and (as a circle or box) for a kit entry that is gone. */
export function unknownBox(widthM: number, depthM: number, part: 'unknown' | 'ghost'): Shape[] {
  return [boxShape(widthM, depthM, part, { stroke: 'soft', fill: 'sheet', weight: 'fine', dash: 'dashed' })]
}

export function ghostCircle(diameterM: number): Shape[] {
  return [
    {
      shape: 'circle',
      centre: plotPoint(0, 0),
      radiusM: diameterM / 2,
      part: 'ghost',
      stroke: 'soft',
      fill: 'sheet',
      weight: 'fine',
      dash: 'dashed',
    },
  ]
}
