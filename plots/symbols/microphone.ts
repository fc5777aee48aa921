import { plotPoint } from '../geometry/point'
import type { Shape } from './shape'

/** A microphone from above, about its middle: a wedge whose narrow end points where it listens. */
export function microphone(widthM: number, lengthM: number): Shape[] {
  const d = lengthM / 2
  const w = widthM / 2
  return [
    {
      shape: 'polygon',
      points: [plotPoint(-w * 0.4, -d), plotPoint(w * 0.4, -d), plotPoint(w, d), plotPoint(-w, d)],
      part: 'microphone',
      fill: 'spike',
      stroke: 'spike',
      weight: 'hair',
    },
  ]
}
