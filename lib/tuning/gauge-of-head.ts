import type { GaugeCalibration } from './gauge-calibration'
import { calibrateGauge } from './gauge-calibration'
import { GaugeError } from './gauge-error'
import { startingGauge } from './gauge-prediction'
import type { StartingGauge } from './gauge-prediction'
import type { GaugeHead, GaugeProfile, GaugeScale } from './gauge-profile'

/** A gauge's calibration, or why it has none. A gauge nobody calibrated is no fault: its pairs are too few. */
export type TriedCalibration =
  | { readonly calibration: GaugeCalibration; readonly refusal: null }
  | { readonly calibration: null; readonly refusal: GaugeError }

export function tryCalibration(profile: GaugeProfile): TriedCalibration {
  try {
    return { calibration: calibrateGauge(profile), refusal: null }
  } catch (error) {
    if (error instanceof GaugeError) return { calibration: null, refusal: error }
    throw error
  }
}

/** What to show of a gauge beside a head: foretold by a calibration, or as the drum tech noted it, relative to that gauge. */
export type HeadGauge =
  | { readonly kind: 'foretold'; readonly gauge: string; readonly scale: GaugeScale; readonly start: StartingGauge }
  | { readonly kind: 'noted'; readonly reading: number }

/**
 * The gauge of one head: by the calibration where there is one and the head has a tap to aim at, else as noted, else null.
 * A tap that no head of this kind can sound has no reading either.
 */
export function gaugeOfHead(
  calibration: GaugeCalibration | null,
  head: GaugeHead,
  wanted: { readonly tapHz: number | null; readonly noted: number | null; readonly temperatureC?: number | null },
): HeadGauge | null {
  const { tapHz, noted, temperatureC = null } = wanted
  if (calibration && tapHz !== null) {
    try {
      const { name: gauge, scale } = calibration
      return { kind: 'foretold', gauge, scale, start: startingGauge(calibration, head, tapHz, temperatureC) }
    } catch (error) {
      if (!(error instanceof GaugeError)) throw error
    }
  }
  return noted === null ? null : { kind: 'noted', reading: noted }
}
