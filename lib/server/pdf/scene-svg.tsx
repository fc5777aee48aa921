import { Circle, G, Line, Polygon, Svg, Text } from '@react-pdf/renderer'
import type { Bounds } from '@/plots/geometry/bounds'
import { paperMm } from '@/plots/geometry/paper'
import type { PlotPoint } from '@/plots/geometry/point'
import type { Scene, SceneItem } from '@/plots/render/build-scene'
import type { Shape, TextRole, TextShape } from '@/plots/symbols/shape'
import { dashMm, ink, strokeMm } from './ink'
import { mm } from './paper-measure'
import { families } from './register-fonts'

const faces: Record<TextRole, { family: keyof typeof families; weight: 400 | 700 }> = {
  name: { family: 'name', weight: 700 },
  note: { family: 'figures', weight: 400 },
  small: { family: 'text', weight: 400 },
  channel: { family: 'figures', weight: 700 },
}

/** Plot metres → points on the drawing, at one scale; upstage is up the sheet. */
interface Placing {
  readonly x: (point: PlotPoint) => number
  readonly y: (point: PlotPoint) => number
  readonly length: (lengthM: number) => number
}

/** Size on paper of a drawing at 1:`scale`, points. */
export function drawingSize(bounds: Bounds, scale: number): { width: number; height: number } {
  return {
    width: mm(paperMm(bounds.maxXM - bounds.minXM, scale)),
    height: mm(paperMm(bounds.maxYM - bounds.minYM, scale)),
  }
}

/** A scene drawn true to scale: one metre of the stage is 1000/`scale` mm of paper, whatever the page. */
export function SceneSvg({ scene, scale }: { scene: Pick<Scene, 'items' | 'bounds'>; scale: number }) {
  const { bounds } = scene
  const length = (lengthM: number) => mm(paperMm(lengthM, scale))
  const placing: Placing = {
    length,
    x: ({ xM }) => length(xM - bounds.minXM),
    y: ({ yM }) => length(bounds.maxYM - yM),
  }
  return (
    <Svg {...drawingSize(bounds, scale)}>
      {scene.items.map((item, index) => (
        <Item key={index} item={item} placing={placing} />
      ))}
    </Svg>
  )
}

function Item({ item, placing: { x, y, length } }: { item: SceneItem; placing: Placing }) {
  switch (item.shape) {
    case 'circle':
      return <Circle {...paint(item)} cx={x(item.centre)} cy={y(item.centre)} r={length(item.radiusM)} />
    case 'line':
      return <Line {...paint(item)} x1={x(item.from)} y1={y(item.from)} x2={x(item.to)} y2={y(item.to)} />
    case 'polygon':
      return <Polygon {...paint(item)} points={item.points.map((point) => `${x(point)},${y(point)}`).join(' ')} />
    case 'text':
      return <Words item={item} at={{ x: x(item.at), y: y(item.at) }} size={length(item.sizeM)} />
  }
}

function Words({ item, at, size }: { item: TextShape; at: { x: number; y: number }; size: number }) {
  const face = faces[item.role]
  const text = (
    <Text
      x={at.x}
      y={at.y}
      fill={ink[item.ink]}
      textAnchor={item.anchor}
      // The writer's drawn words take one family or a stack, though its types name one.
      {...{ fontFamily: families[face.family], fontSize: size, fontWeight: face.weight }}
    >
      {item.text}
    </Text>
  )
  return item.rotationDeg === 0 ? text : <G transform={`rotate(${item.rotationDeg} ${at.x} ${at.y})`}>{text}</G>
}

/** How a shape's outline and area are printed. */
export function paint(item: Shape) {
  return {
    fill: item.fill ? ink[item.fill] : 'none',
    ...(item.stroke
      ? {
          stroke: ink[item.stroke],
          strokeWidth: mm(strokeMm[item.weight ?? 'fine']),
          strokeLinejoin: 'round' as const,
          ...(item.dash ? { strokeDasharray: dashMm[item.dash].map((part) => mm(part)).join(' ') } : {}),
        }
      : {}),
  }
}
