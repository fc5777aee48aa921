import type { PlotPoint } from '../geometry/point'
import type { SceneItem } from '../render/build-scene'
import { paintClasses } from '../render/scene-svg'

/** Stage metres as drawing units: a millimetre each, y downwards, to a hundredth so that server and browser agree. */
const mm = (lengthM: number) => Math.round(lengthM * 1e5) / 100 || 0
const x = (point: PlotPoint) => mm(point.xM)
const y = (point: PlotPoint) => mm(-point.yM)

/** One shape of a scene inside an SVG whose unit is a millimetre on the stage; `app/globals.css` paints its classes. */
export function ShapeDrawing({ item }: { item: SceneItem }) {
  const shared = { className: paintClasses(item), 'data-part': item.part }
  switch (item.shape) {
    case 'circle':
      return <circle {...shared} cx={x(item.centre)} cy={y(item.centre)} r={mm(item.radiusM)} />
    case 'line':
      return <line {...shared} x1={x(item.from)} y1={y(item.from)} x2={x(item.to)} y2={y(item.to)} />
    case 'polygon':
      return <polygon {...shared} points={item.points.map((point) => `${x(point)},${y(point)}`).join(' ')} />
    case 'text':
      return (
        <text
          {...shared}
          x={x(item.at)}
          y={y(item.at)}
          fontSize={mm(item.sizeM)}
          textAnchor={item.anchor}
          transform={item.rotationDeg === 0 ? undefined : `rotate(${item.rotationDeg} ${x(item.at)} ${y(item.at)})`}
        >
          {item.text}
        </text>
      )
  }
}
