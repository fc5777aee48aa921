import { GaugeError } from './gauge-error'

/** The dial as it is printed: its ends and what one division of it is. Its units are the gauge's own, not SI. */
export type GaugeScale = { readonly min: number; readonly max: number; readonly step: number }

/** A head on its drum as the trade writes it: nominal inches, plies in mil, what the coating adds in g/m². */
export type GaugeHead = {
  readonly diameterIn: number
  readonly depthIn: number
  readonly plyMils: readonly number[]
  readonly coatingGPerM2: number
  /** True on a ported drum and on one without the other head: the inner face sees open air, too. A closed shell unless said. */
  readonly openShell?: boolean
}

/** One moment of one head: what the gauge read, and the pitch of a tap near a lug with the other head damped. */
export type GaugePair = GaugeHead & {
  readonly reading: number
  readonly tapHz: number
  /** Of the stage, °C; 20 where nobody wrote it down. */
  readonly temperatureC: number | null
}

/** A gauge in one operator's hand: readings differ by maker, head and operator, so they are learned and never converted. */
export type GaugeProfile = {
  readonly name: string
  readonly scale: GaugeScale
  readonly pairs: readonly GaugePair[]
}

/** @throws GaugeError `quantity` when the dial's ends or its division make no dial */
export function requireGaugeScale({ min, max, step }: GaugeScale): GaugeScale {
  requireFigure('scale.min', min, -1000, 1000, '')
  requireFigure('scale.max', max, -1000, 10_000, '')
  if (max <= min) throw new GaugeError('quantity', 'scale.max', `The dial ends at ${max}, which is not over ${min}.`)
  requireFigure('scale.step', step, 1e-3, max - min, '')
  return { min, max, step }
}

/**
 * A reading that lies on the dial.
 * @throws GaugeError `quantity`
 */
export function requireReading(reading: number, scale: GaugeScale): number {
  return requireFigure('reading', reading, scale.min, scale.max, 'on this dial')
}

/** The commonest slips are a diameter in metres or millimetres: the message says so. @throws GaugeError `quantity` */
export function requireGaugeHead(head: GaugeHead): GaugeHead {
  const slip = unitSlip(head.diameterIn)
  if (slip) throw new GaugeError('quantity', 'diameterIn', slip)
  requireFigure('diameterIn', head.diameterIn, 6, 28, 'in')
  requireFigure('depthIn', head.depthIn, 3, 24, 'in')
  if (head.plyMils.length < 1 || head.plyMils.length > 4)
    throw new GaugeError('quantity', 'plyMils', `A head of ${head.plyMils.length} plies: allowed 1 to 4.`)
  for (const mil of head.plyMils) requireFigure('plyMils', mil, 2, 20, 'mil')
  requireFigure('coatingGPerM2', head.coatingGPerM2, 0, 300, 'g/m²')
  return head
}

/** A finite number within its bounds. @throws GaugeError `quantity` naming the field and what is allowed */
export function requireFigure(field: string, value: number, min: number, max: number, unit: string): number {
  const allowed = `allowed ${min} to ${max} ${unit}`.trim()
  if (typeof value !== 'number' || !Number.isFinite(value))
    throw new GaugeError('quantity', field, `${field} is not a number: ${allowed}.`)
  if (value < min || value > max) throw new GaugeError('quantity', field, `${field} is ${value}: ${allowed}.`)
  return value
}

const MM_PER_INCH = 25.4

function unitSlip(diameterIn: number): string | null {
  if (diameterIn >= 0.15 && diameterIn <= 0.72)
    return `A diameter of ${diameterIn} in looks like metres: ${diameterIn} m is ${((diameterIn * 1000) / MM_PER_INCH).toFixed(1)} in.`
  if (diameterIn >= 150 && diameterIn <= 720)
    return `A diameter of ${diameterIn} in looks like millimetres: ${diameterIn} mm is ${(diameterIn / MM_PER_INCH).toFixed(1)} in.`
  return null
}
