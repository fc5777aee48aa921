import { plotPoint } from '../geometry/point'
import type { Shape } from './shape'

/** A cymbal from above, about its middle: its circle to scale, its bell and the wing nut; hats show both edges. */
export function cymbal(diameterM: number, isPair: boolean): Shape[] {
  const radiusM = diameterM / 2
  const centre = plotPoint(0, 0)
  const ring = (r: number, part: string, weight: 'hair' | 'fine'): Shape => ({
    shape: 'circle',
    centre,
    radiusM: r,
    part,
    stroke: 'brass',
    weight,
  })
  return [
    ring(radiusM, 'edge', 'fine'),
    ...(isPair ? [ring(radiusM - 0.01, 'edge', 'hair')] : []),
    ring(radiusM * 0.3, 'bell', 'hair'),
    { shape: 'circle', centre, radiusM: 0.012, part: 'wing nut', fill: 'brass' },
  ]
}
