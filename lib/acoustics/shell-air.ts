import { airDensityKgPerM3 } from './air'
import { requireDepthM, requireDiameterM } from './require-quantity'
import { shellModes, uniformOverlap } from './shell-overlap'

/** A shell with a head on either end: nominal diameter and depth in m, the stage's temperature in °C. */
export type Shell = { diameterM: number; depthM: number; temperatureC: number }

/**
 * Mass of the air inside a shell as the heads feel it, kg on each m² of head, both heads counted along one axis: `selfKgPerM2`
 * acts on a head by its own movement (all there is while the other head is damped), `crossKgPerM2` by the other's. Heads moving
 * the same way carry self + cross each, opposite ways self − cross.
 */
export type ShellAir = { selfKgPerM2: number; crossKgPerM2: number }

/** What the cut series leaves out of either sum, as a share of ρ·a, is less than this for every m. */
export const SHELL_SERIES_BOUND = 2e-7

/**
 * Air load of the inner faces for shape (m,1) on both heads: incompressible air in a rigid cylinder. Each radial mode k of the
 * air gives self ρa·w·coth(kL/a)/k and cross −ρa·w·csch(kL/a)/k. For m = 0 the uniform part moves as a plug, self w_0·ρL/3 and
 * cross +w_0·ρL/6: the plug goes along with heads that move the same way, ρL/2 on each. Its spring is not here: see `coupledHeads`.
 *
 * Past the N = 40 modes kept, w goes as 4j²/k⁴ with k more than 3 apart; the small factors of w and the coth stay under 1.1
 * together, so what is left out is less than ρa·1.1·j²/(3·k_N⁴): `SHELL_SERIES_BOUND`.
 * Leaves out the wall of the shell moving, the step at the bearing edge, vent holes, and any change of the heads' shapes by the air.
 * @throws AcousticsError m not a whole number 0 to 8, or the shell refused
 */
export function shellAir(m: number, { diameterM, depthM, temperatureC }: Shell): ShellAir {
  const radiusM = requireDiameterM(diameterM) / 2
  const depthOverRadius = requireDepthM(depthM) / radiusM
  const plug = m === 0 ? uniformOverlap() * depthOverRadius : 0
  let [self, cross] = [plug / 3, plug / 6]
  for (const { wavenumber, overlap } of shellModes(m)) {
    const through = wavenumber * depthOverRadius
    self += overlap / (wavenumber * Math.tanh(through))
    cross -= overlap / (wavenumber * Math.sinh(through))
  }
  const perShare = airDensityKgPerM3(temperatureC) * radiusM
  return { selfKgPerM2: perShare * self, crossKgPerM2: perShare * cross }
}
