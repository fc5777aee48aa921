import { airDensityKgPerM3, ROOM_TEMPERATURE_C } from './air'
import { airLoadFactor } from './air-load'
import { filmArealDensityKgPerM2 } from './film'
import type { Film } from './film'
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
