import { hoop, kick, ShapeDrawing } from '@/plots/index'
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
  name: string
  /** The note as it is to be read, "D3" or "C♯3". */
  note?: string | null
  /** Seen from above, as on a plot, or facing the batter head. */
  view: 'above' | 'facing'
  /** How large an inch is drawn; sets the size of the words, which do not scale with the drum. */
  pxPerInch: number
  chosen?: boolean
}

const inchM = 0.0254
const inchMm = 25.4
const nameWidthEm = 0.5
const noteWidthEm = 0.62

/** Whether the drum is seen as its rectangle. */
export function liesDown({ role, view }: Pick<HoopDrawingProps, 'role' | 'view'>): boolean {
  return role === 'kick' && view === 'above'
}

/** Words at their usual size, or as much smaller as it takes to stay inside. Sizes are in pixels. */
function fitted(text: string, usualPx: number, widthEm: number, roomPx: number): number {
  return Math.min(usualPx, roomPx / Math.max(1, text.length * widthEm))
}

/** A name parted at the space nearest its middle; a name of one word stays whole. */
function inTwo(name: string): string[] {
  const spaces = [...name].flatMap((letter, index) => (letter === ' ' ? [index] : []))
  const middle = (name.length - 1) / 2
  const [at] = spaces.sort((a, b) => Math.abs(a - middle) - Math.abs(b - middle))
  return at === undefined ? [name] : [name.slice(0, at), name.slice(at + 1)]
}

/**
 * A drum to scale about its own centre, one unit a millimetre: the plot's own drawing of it (a double line, one tick for
 * each real lug) with its name and note inside. Stands inside any SVG; `Hoop` is the same as a picture of its own.
 */
export function HoopDrawing(props: HoopDrawingProps) {
  const { diameterIn, depthIn, lugs, name, note, pxPerInch, chosen } = props
  const lying = liesDown(props)
  const shapes = lying ? kick(diameterIn * inchM, depthIn * inchM, lugs) : hoop(diameterIn * inchM, lugs)
  const roomPx = diameterIn * pxPerInch * (lying ? 0.86 : 0.76)
  const usualPx = Math.max(11, Math.min(17, diameterIn * pxPerInch * 0.17))
  const lines = fitted(name, usualPx, nameWidthEm, roomPx) < 10 ? inTwo(name) : [name]
  const namePx = Math.min(...lines.map((line) => fitted(line, usualPx, nameWidthEm, roomPx)))
  const notePx = note ? fitted(note, Math.max(10, namePx * 0.82), noteWidthEm, roomPx) : 0
  const px = inchMm / pxPerInch

  return (
    <g className={chosen ? 'chosen' : undefined}>
      {shapes.map((shape, index) => (
        <ShapeDrawing key={index} item={{ ...shape, pieceId: null }} />
      ))}
      <g textAnchor="middle">
        {lines.map((line, index) => (
          <text
            key={line}
            className="text-name fill-ink"
            fontSize={round(namePx * px)}
            y={round((index - (lines.length - 1) + (note ? -0.1 : lines.length > 1 ? 0.9 : 0.34)) * namePx * px)}
          >
            {line}
          </text>
        ))}
        {note && (
          <text className="text-note fill-soft" fontSize={round(notePx * px)} y={round(1.15 * namePx * px)}>
            {note}
          </text>
        )}
      </g>
    </g>
  )
}
