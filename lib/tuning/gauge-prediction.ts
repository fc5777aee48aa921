import type { GaugeCalibration } from './gauge-calibration'
import { outsideRange, tensionAtReading } from './gauge-calibration'
import { readingAt } from './gauge-curve'
import { requireReading } from './gauge-profile'
import type { GaugeHead, GaugeScale } from './gauge-profile'
import { tapOfTensionHz, tensionOfTapNPerM } from './gauge-tension'

/** Asked past the calibrated range, nothing is extrapolated: the figure is the end's, and `outside` says on which side the truth lies. */
export type Outside = 'under' | 'over' | null

/** What the gauge should read, in its own units; one reading lies from `low` to `high` with the chance `GAUGE_COVERAGE`. */
export type StartingGauge = {
  readonly reading: number
  readonly low: number
  readonly high: number
  readonly outside: Outside
  readonly tensionNPerM: number
}

/** What a head sounds near a lug where the gauge reads so much, Hz, and the film tension behind it, N/m. */
export type TapOfReading = {
  readonly tapHz: number
  readonly lowHz: number
  readonly highHz: number
  readonly outside: Outside
  readonly tensionNPerM: number
}

/**
 * The reading to start from on a head that shall sound `tapHz` near a lug (other head damped). Holds for any head, in or out
 * of the pairs.
 * @throws GaugeError `quantity`
 */
export function startingGauge(
  calibration: GaugeCalibration,
  head: GaugeHead,
  tapHz: number,
  temperatureC: number | null = null,
): StartingGauge {
  const tensionNPerM = tensionOfTapNPerM(head, tapHz, temperatureC)
  const lnTension = Math.log(tensionNPerM)
  const onDial = (reading: number) => clamp(reading, calibration.scale)
  return {
    reading: onDial(readingAt(calibration.middle, lnTension)),
    low: onDial(readingAt(calibration.low, lnTension)),
    high: onDial(readingAt(calibration.high, lnTension)),
    outside: outsideRange(calibration, tensionNPerM),
    tensionNPerM,
  }
}

/**
 * The way back: what a head sounds near a lug at a reading. The bounds are the tensions at which that reading still lies
 * within the interval, no further than the calibrated range.
 * @throws GaugeError `quantity`
 */
export function tapOfReading(
  calibration: GaugeCalibration,
  head: GaugeHead,
  reading: number,
  temperatureC: number | null = null,
): TapOfReading {
  requireReading(reading, calibration.scale)
  const tensionNPerM = tensionAtReading(calibration.middle, reading)
  const tap = (tension: number) => tapOfTensionHz(head, tension, temperatureC)
  return {
    tapHz: tap(tensionNPerM),
    lowHz: tap(tensionAtReading(calibration.high, reading)),
    highHz: tap(tensionAtReading(calibration.low, reading)),
    outside: outsideReadings(calibration, reading),
    tensionNPerM,
  }
}

/**
 * One reading on heads of other film on the same drum: the tension is the same, so the heavier head sounds lower (common
 * practice, and derived). `cents` counts from the first film.
 * @throws GaugeError `quantity`
 */
export function sameReadingOnFilms<Film extends Pick<GaugeHead, 'plyMils' | 'coatingGPerM2'>>(
  calibration: GaugeCalibration,
  drum: Pick<GaugeHead, 'diameterIn' | 'depthIn'>,
  films: readonly Film[],
  reading: number,
  temperatureC: number | null = null,
): (TapOfReading & { readonly film: Film; readonly cents: number })[] {
  const taps = films.map((film) => ({
    film,
    ...tapOfReading(calibration, { ...drum, ...film }, reading, temperatureC),
  }))
  const first = taps[0]?.tapHz ?? Number.NaN
  return taps.map((tap) => ({ ...tap, cents: 1200 * Math.log2(tap.tapHz / first) }))
}

function outsideReadings({ middle }: GaugeCalibration, reading: number): Outside {
  const rounding = 1e-9
  if (reading < (middle.readings[0] ?? Number.NaN) - rounding) return 'under'
  return reading > (middle.readings.at(-1) ?? Number.NaN) + rounding ? 'over' : null
}

function clamp(reading: number, { min, max }: GaugeScale): number {
  return Math.min(max, Math.max(min, reading))
}
