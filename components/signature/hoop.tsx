import { HoopDrawing, liesDown } from './hoop-drawing'
import type { HoopDrawingProps } from './hoop-drawing'
import { round } from './round'

export interface HoopProps extends HoopDrawingProps {
  className?: string
}

/** Room round the shell for lugs and claws, inches in all. */
const lugRoomIn = 2.2
const inchMm = 25.4

/** One drum as a picture to scale, named for screen readers. */
export function Hoop({ className, ...drum }: HoopProps) {
  const width = drum.diameterIn + lugRoomIn
  const height = (liesDown(drum) ? drum.depthIn : drum.diameterIn) + lugRoomIn
  const box = [-width / 2, -height / 2, width, height].map((lengthIn) => round(lengthIn * inchMm))
  return (
    <svg
      role="img"
      aria-label={[
        drum.name,
        `${drum.diameterIn} in across, ${drum.depthIn} deep, ${drum.lugs} lugs`,
        drum.note ? `note ${drum.note}` : null,
      ]
        .filter(Boolean)
        .join(', ')}
      viewBox={box.join(' ')}
      width={round(width * drum.pxPerInch)}
      height={round(height * drum.pxPerInch)}
      className={className}
    >
      <HoopDrawing {...drum} />
    </svg>
  )
}
