import { requireQuantity } from './require-quantity'

const ABSOLUTE_ZERO_C = -273.15
const ROOM_K = 293.15

/** Density of dry air at 20 °C and 101 325 Pa, kg/m³. */
const ROOM_DENSITY_KG_PER_M3 = 1.2041

/** Speed of sound at 20 °C, m/s: ISO 9613-1. */
const ROOM_SOUND_SPEED_M_PER_S = 343.2

export const ROOM_TEMPERATURE_C = 20

/** Absolute temperature in K of a stage at −40 to 60 °C. @throws AcousticsError */
function stageTemperatureK(temperatureC: number): number {
  return requireQuantity('temperatureC', temperatureC, { min: -40, max: 60, unit: '°C' }) - ABSOLUTE_ZERO_C
}

/**
 * Density of dry air in kg/m³ at sea-level pressure: 1.2041·(293.15/T), the ideal gas law.
 * Leaves out humidity (under 1 %) and altitude (about 1 % per 100 m).
 * @throws AcousticsError temperature outside −40 to 60 °C
 */
export function airDensityKgPerM3(temperatureC: number): number {
  return ROOM_DENSITY_KG_PER_M3 * (ROOM_K / stageTemperatureK(temperatureC))
}

/**
 * Speed of sound in air in m/s: 343.2·√(T/293.15).
 * @throws AcousticsError temperature outside −40 to 60 °C
 * Source: ISO 9613-1.
 */
export function soundSpeedMPerS(temperatureC: number): number {
  return ROOM_SOUND_SPEED_M_PER_S * Math.sqrt(stageTemperatureK(temperatureC) / ROOM_K)
}
