import { requireDiameterM, requireQuantity, requireTensionNPerM, requireWhole } from './require-quantity'

/** Major diameter of a 12-24 UNC thread, m (0.216 in). 12-24 rods are common practice on drums. */
export const ROD_DIAMETER_M = 5.4864e-3

/** Torque coefficient K of a dry and of a lubricated thread: Shigley's Mechanical Engineering Design, table of torque factors. */
export const TORQUE_FACTOR_DRY = 0.2
export const TORQUE_FACTOR_LUBRICATED = 0.18

/** Torque for one and the same pull scatters by ±30 % or more: Shigley, on torque-wrench tightening. */
export const TORQUE_SCATTER = 0.3

export type TorqueRange = { lowNm: number; nominalNm: number; highNm: number }

/**
 * Pull in N on each tension rod: 2πaT/N. The film's whole edge pull, shared by the rods; edge friction left out.
 * @throws AcousticsError lugs not a whole number 4 to 12
 */
export function rodPullN(tensionNPerM: number, diameterM: number, lugs: number): number {
  requireWhole('lugs', lugs, { min: 4, max: 12, unit: 'lugs' })
  return (Math.PI * requireDiameterM(diameterM) * requireTensionNPerM(tensionNPerM)) / lugs
}

/**
 * Key torque in N·m for a rod pull: M = K·d·F, nominal with a dry thread. The range runs from a lubricated thread 30 %
 * under to a dry thread 30 % over: torque is a poor way to even a head.
 * @throws AcousticsError pull outside 0 to 40 000 N, a large drum's at its most
 */
export function keyTorqueNm(pullN: number): TorqueRange {
  requireQuantity('pullN', pullN, { min: 0, max: 40_000, unit: 'N' })
  const nominalNm = TORQUE_FACTOR_DRY * ROD_DIAMETER_M * pullN
  return {
    lowNm: TORQUE_FACTOR_LUBRICATED * ROD_DIAMETER_M * pullN * (1 - TORQUE_SCATTER),
    nominalNm,
    highNm: nominalNm * (1 + TORQUE_SCATTER),
  }
}
