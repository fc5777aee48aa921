import { airDensityKgPerM3, ROOM_TEMPERATURE_C } from './air'
import { airLoadFactor } from './air-load'
import { filmArealDensityKgPerM2 } from './film'
import type { Film } from './film'
import { idealModeHz, idealTensionNPerM } from './membrane-mode'
import { requireDiameterM } from './require-quantity'

/** A head in the open: both faces see free air, no shell. `temperatureC` is the stage's, 20 °C unless given. */
export type OpenAirHead = Film & { diameterM: number; temperatureC?: number }

/**
 * Film and moving air together, kg/m², for shape (m,1): σ + β_m·ρ_air·a.
 * @throws AcousticsError
 */
export function openAirDensityKgPerM2(m: number, head: OpenAirHead): number {
  const airDensity = airDensityKgPerM3(head.temperatureC ?? ROOM_TEMPERATURE_C)
  return filmArealDensityKgPerM2(head) + (airLoadFactor(m) * airDensity * requireDiameterM(head.diameterM)) / 2
}

/**
 * Frequency in Hz of shape (m,1) of a head in the open air; m = 0 is the note, m = 1 the tap beside a lug.
 * Leaves out the shell, its air and the other head, bending stiffness and radiation.
 * @throws AcousticsError
 */
export function openAirModeHz(m: number, tensionNPerM: number, head: OpenAirHead): number {
  return idealModeHz(
    { m, n: 1 },
    { diameterM: head.diameterM, tensionNPerM, arealDensityKgPerM2: openAirDensityKgPerM2(m, head) },
  )
}

/**
 * Film tension in N/m that sounds a wanted (0,1) note in the open air: the inverse of `openAirModeHz(0, …)`, in closed form.
 * @throws AcousticsError note outside 10 to 5000 Hz, or the head refused
 */
export function openAirTensionNPerM(noteHz: number, head: OpenAirHead): number {
  return idealTensionNPerM({ m: 0, n: 1 }, noteHz, {
    diameterM: head.diameterM,
    arealDensityKgPerM2: openAirDensityKgPerM2(0, head),
  })
}

/**
 * Tap over note, f11/f01, in the open air. Does not depend on the tension. 1.593 in vacuum, nearer 1.8 on a 12 in head,
 * because air loads the note more than the tap.
 * @throws AcousticsError
 */
export function openAirTapRatio(head: OpenAirHead): number {
  const anyTensionNPerM = 1000
  return openAirModeHz(1, anyTensionNPerM, head) / openAirModeHz(0, anyTensionNPerM, head)
}
