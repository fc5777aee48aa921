import { AcousticsError } from '@/lib/acoustics/acoustics-error'
import { centsBetween, shiftByCents } from '@/lib/acoustics/note'
import { requirePitchHz, requireQuantity, requireWhole } from '@/lib/acoustics/require-quantity'
import { requireLugs } from './lug-order'
import { standingReadings } from './readings'
import type { Reading } from './readings'

/** Which readings to judge by: tap pitches (Hz and cents together) or the gauge. The two are never mixed. */
export type ReadingBasis = 'tap' | 'gauge'

export type HeadStateInput = {
  /** Every reading logged for this head, of any basis. */
  readings: readonly Reading[]
  basis: ReadingBasis
  /** Lugs on the head, 4 to 12. */
  lugs: number
  /** Tap pitch wanted, Hz. Without it lugs are judged against their own mean. Not used with the gauge. */
  targetHz?: number
  /** How far off a lug may be and still count as even: cents with basis 'tap', gauge units with 'gauge'. */
  tolerance: number
}

export type LugState = {
  lug: number
  /** The latest reading that stands, or null when there is none of this basis. */
  reading: Reading | null
  /** Hz, or gauge units. Null when there is no reading, or only cents without a target. */
  value: number | null
  /** Cents from the target; null without one, without a reading, or with the gauge. */
  fromTarget: number | null
  /** From the mean of the lugs that were read: cents, or gauge units. */
  fromMean: number | null
  /** Out beyond the tolerance; null when not read. */
  out: boolean | null
}

export type HeadState = {
  basis: ReadingBasis
  /** Unit of `fromTarget`, `fromMean`, `spread`. */
  unit: 'cents' | 'gauge'
  /** What `out` is judged against. */
  against: 'target' | 'mean'
  lugs: LugState[]
  /** Mean in Hz (of the pitches, evenly in cents) or gauge units. */
  mean: number | null
  /** Mean from the target, cents. */
  meanFromTarget: number | null
  /** Highest less lowest, cents or gauge units. */
  spread: number | null
  missing: number[]
  out: number[]
  /** Every lug read and none out. */
  even: boolean
}

/**
 * The present state of a head from its log of readings.
 * A reading in cents is taken from the present target; without a target it still compares with other readings in cents, but
 * cannot be mixed with readings in Hz.
 * @throws AcousticsError naming `lugs`, `tolerance`, `targetHz`, `lug`, `unit` or `value`
 */
export function headState({ readings, basis, lugs, targetHz, tolerance }: HeadStateInput): HeadState {
  requireLugs(lugs)
  requireQuantity('tolerance', tolerance, { min: 0, max: 600, unit: basis === 'tap' ? 'cents' : '' })
  if (targetHz !== undefined) requirePitchHz('targetHz', targetHz)

  const latest = new Map<number, Reading>()
  for (const reading of standingReadings(readings)) {
    if (isGauge(reading) !== (basis === 'gauge')) continue
    requireWhole('lug', reading.lug, { min: 1, max: lugs, unit: '' })
    latest.set(reading.lug, reading)
  }

  const scale = basis === 'gauge' ? GAUGE_SCALE : tapScale(targetHz, [...latest.values()])
  const heights = new Map([...latest].map(([lug, reading]) => [lug, scale.heightOf(reading)]))
  const all = [...heights.values()]
  const mean = all.length === 0 ? null : all.reduce((sum, height) => sum + height, 0) / all.length
  const against = basis === 'tap' && targetHz !== undefined ? 'target' : 'mean'

  const states = Array.from({ length: lugs }, (_, i): LugState => {
    const lug = i + 1
    const height = heights.get(lug)
    if (height === undefined || mean === null) {
      return { lug, reading: null, value: null, fromTarget: null, fromMean: null, out: null }
    }
    const fromMean = height - mean
    const fromTarget = against === 'target' ? height : null
    return {
      lug,
      reading: latest.get(lug) ?? null,
      value: scale.valueAt(height),
      fromTarget,
      fromMean,
      // A hair of slack keeps a reading typed exactly at the tolerance inside it, whatever the rounding.
      out: Math.abs(fromTarget ?? fromMean) > tolerance + 1e-9,
    }
  })
  const missing = states.filter(({ out }) => out === null).map(({ lug }) => lug)
  const out = states.filter((state) => state.out === true).map(({ lug }) => lug)
  return {
    basis,
    unit: basis === 'tap' ? 'cents' : 'gauge',
    against,
    lugs: states,
    mean: mean === null ? null : scale.valueAt(mean),
    meanFromTarget: against === 'target' ? mean : null,
    spread: all.length === 0 ? null : Math.max(...all) - Math.min(...all),
    missing,
    out,
    even: missing.length === 0 && out.length === 0,
  }
}

function isGauge(reading: Reading): boolean {
  const gauge = reading.unit === 'gauge'
  if (gauge !== (reading.method === 'gauge')) {
    throw new AcousticsError('unit', `A reading by ${reading.method} cannot be in ${reading.unit}.`)
  }
  return gauge
}

/** Readings laid on one even scale of heights, in cents or gauge units. */
type Scale = {
  heightOf: (reading: Reading) => number
  /** Hz or gauge units of a height; null when only cents are known. */
  valueAt: (height: number) => number | null
}

const GAUGE_SCALE: Scale = {
  heightOf: ({ value }) => requireQuantity('value', value, { min: 0, max: 1000, unit: '' }),
  valueAt: (height) => height,
}

/** Where heights count from when there is no target; any pitch would do, since only differences are then used. */
const NO_TARGET_ZERO_HZ = 100

function tapScale(targetHz: number | undefined, readings: readonly Reading[]): Scale {
  const units = new Set(readings.map(({ unit }) => unit))
  if (targetHz === undefined && units.size > 1) {
    throw new AcousticsError(
      'unit',
      'Readings in cents and in Hz stand side by side: a target pitch is needed to compare them.',
    )
  }
  const zeroHz = targetHz ?? NO_TARGET_ZERO_HZ
  const onlyCents = targetHz === undefined && units.has('cents')
  return {
    heightOf: ({ unit, value }) =>
      unit === 'cents'
        ? requireQuantity('value', value, { min: -2400, max: 2400, unit: 'cents' })
        : centsBetween(zeroHz, requirePitchHz('value', value)),
    valueAt: (height) => (onlyCents ? null : shiftByCents(zeroHz, height)),
  }
}
