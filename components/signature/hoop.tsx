import { HoopDrawing, lugReachIn } from './hoop-drawing'
import type { HoopDrawingProps } from './hoop-drawing'
import { round } from './round'

export interface HoopProps extends HoopDrawingProps {
  className?: string
}

/** One drum as a picture to scale, named for screen readers. */
export function Hoop({ className, ...drum }: HoopProps) {
  const lying = drum.role === 'kick' && drum.view === 'above'
  const width = drum.diameterIn + (lying ? 0.5 : 2 * lugReachIn + 0.5)
  const height = lying ? drum.depthIn + 0.5 : width
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
      viewBox={`${round(-width / 2)} ${round(-height / 2)} ${round(width)} ${round(height)}`}
      width={round(width * drum.pxPerInch)}
      height={round(height * drum.pxPerInch)}
      className={className}
    >
      <HoopDrawing {...drum} />
    </svg>
  )
}
