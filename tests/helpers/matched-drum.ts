/**
 * A 12×8 in drum with the same 10 mil film at the same pitch on both ends, in closed form and nowhere near the code: matched heads move
 * as one, so the spring of the air drops out and every part of it is a mass.
 */

/** Metres: 12 in across, 8 in deep. */
const radiusM = 0.1524
const depthM = 0.2032
/** Dry air at 20 °C, kg/m³ (published). */
const air = 1.2041
/** PET 1390 kg/m³ (published), 254 µm. */
const film = 1390 * 254e-6
/** Zeros: Abramowitz & Stegun table 9.5 (published). */
const j01 = 2.404825557696
const j11 = 3.831705970208
/** Air loads of an open head, both faces (derived). */
const [beta0, beta1] = [1.4928, 0.6602]
/** Zeros of J0′ and of J1′ after 0, A&S table 9.5 (published): the air’s modes in a cylinder. What lies beyond is under 1e-4. */
const k0 = [3.83171, 7.01559, 10.17347, 13.32369, 16.47063]
const k1 = [1.84118, 5.33144, 8.53632, 11.706, 14.86359]

const through = depthM / radiusM
/** Film with its air for the note: half the outer load, the plug, and the other modes as heads that move alike feel them. */
const noteMass = (thickness: number) =>
  film * thickness +
  air *
    radiusM *
    (beta0 / 2 +
      ((4 / j01 ** 2) * through) / 2 +
      k0.reduce((sum, k) => sum + ((4 * j01 ** 2) / (k * k - j01 ** 2) ** 2 / k) * Math.tanh((k * through) / 2), 0))
/** The same for a tap with the other head damped. */
const tapMass = (thickness: number) =>
  film * thickness +
  air *
    radiusM *
    (beta1 / 2 +
      k1.reduce(
        (sum, k) => sum + (4 * j11 ** 2) / (k * k - j11 ** 2) ** 2 / (1 - 1 / k ** 2) / k / Math.tanh(k * through),
        0,
      ))

/** Film tension of either head for a note, N/m: σ·(2πa·f/j01)²; of film so many times as thick as nominal. */
export function matchedTensionNPerM(noteHz: number, thickness = 1): number {
  return noteMass(thickness) * ((2 * Math.PI * radiusM * noteHz) / j01) ** 2
}

/** Pull on each of six rods, N: 2πaT/6. */
export function matchedRodPullN(noteHz: number): number {
  return (2 * Math.PI * radiusM * matchedTensionNPerM(noteHz)) / 6
}

/** Tap over note, the other head damped: 1.744 at nominal thickness (derived). */
export function matchedTapRatio(thickness = 1): number {
  return (j11 / j01) * Math.sqrt(noteMass(thickness) / tapMass(thickness))
}

/** Factor from a figure to its bounds: 2 % on a pitch (Rossing 1982, published) with 5 % of film thickness (from memory). */
export function matchedTapScatter(): number {
  return Math.exp(Math.hypot(0.02, Math.log(matchedTapRatio(1.05) / matchedTapRatio(0.95)) / 2))
}
