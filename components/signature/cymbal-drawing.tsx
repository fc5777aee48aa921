import { round } from './round'

export interface CymbalDrawingProps {
  /** Nominal inches. */
  diameterIn: number
  name: string
  pxPerInch: number
  chosen?: boolean
}

/** A cymbal from above about its own centre, in inches: edge, bell and hole in brass. */
export function CymbalDrawing({ diameterIn, name, pxPerInch, chosen }: CymbalDrawingProps) {
  const radius = diameterIn / 2
  const px = 1 / pxPerInch
  return (
    <g className="text-brass" stroke="currentColor" fill="none">
      <circle r={radius} strokeWidth={round((chosen ? 3.5 : 1.75) * px)} className="fill-paper" fillOpacity={0.72} />
      <circle r={round(radius * 0.66)} strokeWidth={round(0.75 * px)} />
      <circle r={round(Math.max(0.5, 3.5 * px))} fill="currentColor" stroke="none" />
      <text
        className="figures"
        stroke="none"
        fill="currentColor"
        textAnchor="middle"
        fontSize={round(12 * px)}
        y={round(-radius * 0.72)}
      >
        {name}
      </text>
    </g>
  )
}
