import { ShapeDrawing } from '@/plots/index'
import type { Scene } from '@/plots/index'
import { round } from './round'

export interface SceneDrawingProps {
  scene: Scene
  /** The drawing in words, for a screen reader. */
  label: string
  /** Clear space round the drawing, metres. */
  marginM?: number
  className?: string
}

/** A scene of the plot to look at: true to scale, as wide as its place. */
export function SceneDrawing({ scene, label, marginM = 0.05, className }: SceneDrawingProps) {
  const { minXM, minYM, maxXM, maxYM } = scene.bounds
  const box = [minXM - marginM, -maxYM - marginM, maxXM - minXM + 2 * marginM, maxYM - minYM + 2 * marginM]
  return (
    <svg
      role="img"
      aria-label={label}
      viewBox={box.map((lengthM) => round(lengthM * 1000)).join(' ')}
      className={className}
    >
      {scene.items.map((item, index) => (
        <ShapeDrawing key={index} item={item} />
      ))}
    </svg>
  )
}
