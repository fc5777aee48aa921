import { clockPoint } from './clock-point'
import { round } from './round'

export interface HoopDrawingProps {
  /** What the drum is; a kick lies on its side, so that from above it is its rectangle. */
  role: 'kick' | 'snare' | 'tom' | 'floor-tom'
  /** Nominal inches. */
  diameterIn: number
  /** Nominal inches. */
  depthIn: number
  /** Lugs per head. */
  lugs: number
  /** Where they sit, clockwise from twelve o'clock of what is drawn, radians; evenly spaced from twelve if not given. */
  lugAnglesRad?: readonly number[]
  name: string
  /** The note as it is to be read, "D3" or "C♯3". */
  note?: string | null
  /** Seen from above, as on a plot, or facing the batter head. */
  view: 'above' | 'facing'
  /** How large an inch is drawn; sets the size of the words, which do not scale with the drum. */
  pxPerInch: number
  chosen?: boolean
}

/** How far lugs and claws stand out from the hoop, inches. */
export const lugReachIn = 0.9

const nameWidthEm = 0.5
const noteWidthEm = 0.62

/** Words at their usual size, or as much smaller as it takes to stay inside. Sizes are in pixels. */
function fitted(text: string, usualPx: number, widthEm: number, roomPx: number): number {
  return Math.min(usualPx, roomPx / Math.max(1, text.length * widthEm))
}

/**
 * A drum to scale about its own centre, in inches: a double line, one tick for each real lug, its name and note inside.
 * Stands inside any SVG; `Hoop` is the same as a picture of its own.
 */
export function HoopDrawing(props: HoopDrawingProps) {
  const { role, diameterIn, depthIn, lugs, name, note, view, pxPerInch, chosen } = props
  const radius = diameterIn / 2
  const angles = props.lugAnglesRad ?? Array.from({ length: lugs }, (_, i) => (i * 2 * Math.PI) / lugs)
  const px = 1 / pxPerInch
  const lying = role === 'kick' && view === 'above'
  const roomPx = diameterIn * pxPerInch * (lying ? 0.86 : 0.78)
  const namePx = fitted(name, Math.max(11, Math.min(17, diameterIn * pxPerInch * 0.17)), nameWidthEm, roomPx)
  const notePx = note ? fitted(note, Math.max(10, namePx * 0.82), noteWidthEm, roomPx) : 0

  return (
    <g className="text-ink" stroke="currentColor" fill="none">
      {lying ? (
        <LyingShell {...{ radius, depthIn, angles, px, chosen }} />
      ) : (
        <>
          <circle r={round(radius)} className="fill-sheet" strokeWidth={round((chosen ? 3.5 : 2) * px)} />
          <circle r={round(radius - Math.max(0.45, 3 * px))} strokeWidth={round(px)} />
          {angles.map((angle, index) => {
            const from = clockPoint(angle, radius)
            const to = clockPoint(angle, radius + lugReachIn)
            return (
              <line
                key={index}
                data-lug={index + 1}
                x1={from.x}
                y1={from.y}
                x2={to.x}
                y2={to.y}
                strokeWidth={round(Math.max(0.55, 2.5 * px))}
              />
            )
          })}
        </>
      )}
      <g stroke="none" fill="currentColor" textAnchor="middle">
        <text className="name" fontSize={round(namePx * px)} y={round((note ? -0.1 : 0.34) * namePx * px)}>
          {name}
        </text>
        {note && (
          <text className="figures fill-soft" fontSize={round(notePx * px)} y={round(1.15 * namePx * px)}>
            {note}
          </text>
        )}
      </g>
    </g>
  )
}

/** A kick from above: diameter by depth, a hoop at either end, and the claws that can be seen from there. */
function LyingShell(props: {
  radius: number
  depthIn: number
  angles: readonly number[]
  px: number
  chosen: boolean | undefined
}) {
  const { radius, depthIn, angles, px, chosen } = props
  const half = depthIn / 2
  const hoop = Math.min(1.5, depthIn / 6)
  // The upper half of the head is what shows from above; a lug at its very edge still does.
  const seen = angles.map((angle, index) => ({ angle, lug: index + 1 })).filter(({ angle }) => Math.cos(angle) > -0.01)
  return (
    <>
      <rect
        x={-radius}
        y={-half}
        width={radius * 2}
        height={depthIn}
        className="fill-sheet"
        strokeWidth={round((chosen ? 3.5 : 2) * px)}
      />
      {[-1, 1].map((end) => (
        <g key={end}>
          <line x1={-radius} x2={radius} y1={end * (half - hoop)} y2={end * (half - hoop)} strokeWidth={round(px)} />
          {seen.map(({ angle, lug }) => {
            const x = round(Math.sin(angle) * radius)
            return (
              <line
                key={lug}
                data-lug={lug}
                x1={x}
                x2={x}
                y1={end * half}
                y2={end * (half - hoop)}
                strokeWidth={round(Math.max(0.55, 2.5 * px))}
              />
            )
          })}
        </g>
      ))}
    </>
  )
}
