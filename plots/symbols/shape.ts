import { turnClockwise } from '../geometry/angle'
import { plotPoint, type PlotPoint } from '../geometry/point'

/**
 * The primitives every drawing is made of, in plot metres (x to stage left, y upstage). Paint is named by token, never
 * by colour, so that screen, paper and black-and-white each decide what it looks like.
 */
export type Ink = 'ink' | 'soft' | 'line' | 'spike' | 'brass'
export type Fill = 'sheet' | 'wash' | Ink
export type Weight = 'hair' | 'fine' | 'bold'
export type Dash = 'dashed' | 'chain'

export interface Paint {
  readonly stroke?: Ink
  readonly fill?: Fill
  /** Thickness of the stroke: hair 0.75, fine 1.25, bold 2.25 px on screen and about a quarter of that in mm on paper. */
  readonly weight?: Weight
  readonly dash?: Dash
}

export interface CircleShape extends Paint {
  readonly shape: 'circle'
  readonly centre: PlotPoint
  readonly radiusM: number
  /** What the circle is, for readers of the scene and for tests. */
  readonly part: string
}

export interface LineShape extends Paint {
  readonly shape: 'line'
  readonly from: PlotPoint
  readonly to: PlotPoint
  readonly part: string
}

export interface PolygonShape extends Paint {
  readonly shape: 'polygon'
  readonly points: readonly PlotPoint[]
  readonly part: string
}

export type TextRole = 'name' | 'note' | 'small' | 'channel'

export interface TextShape {
  readonly shape: 'text'
  readonly text: string
  readonly role: TextRole
  readonly ink: Ink
  /** Where the text's anchor stands on its baseline. */
  readonly at: PlotPoint
  /** Em height in metres. */
  readonly sizeM: number
  readonly anchor: 'start' | 'middle' | 'end'
  /** Degrees clockwise; words at the sheet's sides stand upright on end. */
  readonly rotationDeg: number
  readonly part: string
}

export type Shape = CircleShape | LineShape | PolygonShape
export type DrawnShape = Shape | TextShape

/** A shape drawn about its own middle and facing the audience, put where a piece stands and turned its way. */
export function standAt(shape: Shape, at: PlotPoint, rotationDeg: number): Shape {
  const put = (point: PlotPoint) => {
    const turned = turnClockwise(point, rotationDeg)
    return plotPoint(turned.xM + at.xM, turned.yM + at.yM)
  }
  switch (shape.shape) {
    case 'circle':
      return { ...shape, centre: put(shape.centre) }
    case 'line':
      return { ...shape, from: put(shape.from), to: put(shape.to) }
    case 'polygon':
      return { ...shape, points: shape.points.map(put) }
  }
}

/** An upright rectangle about the middle. */
export function boxShape(widthM: number, depthM: number, part: string, paint: Paint): PolygonShape {
  const w = widthM / 2
  const d = depthM / 2
  return {
    shape: 'polygon',
    points: [plotPoint(-w, -d), plotPoint(w, -d), plotPoint(w, d), plotPoint(-w, d)],
    part,
    ...paint,
  }
}
