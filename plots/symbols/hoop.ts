import { plotPoint } from '../geometry/point'
import type { Shape } from './shape'

/** How far a lug or claw stands out from the hoop, metres; common practice. */
const LUG_OUT_M = 0.022
/** From the shell's edge to the inner line of the hoop, metres; common practice. */
const HOOP_IN_M = 0.012

/**
 * Angles of evenly spaced lugs in degrees clockwise from the audience side; the first stands half a space round, so
 * that no lug points straight at the audience and the pattern is the same from both sides.
 */
export function lugAnglesDeg(lugs: number): number[] {
  return Array.from({ length: lugs }, (_, index) => ((index + 0.5) * 360) / lugs)
}

/** A drum from above, about its middle: its own circle to scale, a double line, one tick per real lug. */
export function hoop(diameterM: number, lugs: number): Shape[] {
  const radiusM = diameterM / 2
  const centre = plotPoint(0, 0)
  return [
    ...lugAnglesDeg(lugs).map((angleDeg): Shape => {
      const angle = (angleDeg * Math.PI) / 180
      const out = (r: number) => plotPoint(-Math.sin(angle) * r, -Math.cos(angle) * r)
      return {
        shape: 'line',
        from: out(radiusM),
        to: out(radiusM + LUG_OUT_M),
        part: 'lug',
        stroke: 'ink',
        weight: 'bold',
      }
    }),
    { shape: 'circle', centre, radiusM, part: 'shell', stroke: 'ink', fill: 'sheet', weight: 'bold' },
    {
      shape: 'circle',
      centre,
      radiusM: Math.max(radiusM - HOOP_IN_M, radiusM / 2),
      part: 'hoop',
      stroke: 'ink',
      weight: 'hair',
    },
  ]
}

/**
 * A kick from above, about its middle and facing the audience: a rectangle, diameter by depth, a line for each hoop and
 * a tick for every claw that can be seen from above (the upper half of each head’s lugs and those at its sides), where it
 * really stands.
 */
export function kick(diameterM: number, depthM: number, lugs: number): Shape[] {
  const w = diameterM / 2
  const d = depthM / 2
  const hoopDepthM = Math.min(0.04, depthM / 6)
  const seen = lugAnglesDeg(lugs)
    .map((angleDeg) => (angleDeg * Math.PI) / 180)
    .filter((angle) => Math.cos(angle) < 1e-9)
    .map((angle) => -Math.sin(angle) * w)
  const claws = [-1, 1].flatMap((side) =>
    seen.map((x): Shape => ({
      shape: 'line',
      from: plotPoint(x, side * d),
      to: plotPoint(x, side * (d + LUG_OUT_M)),
      part: 'claw',
      stroke: 'ink',
      weight: 'bold',
    })),
  )
  return [
    ...claws,
    {
      shape: 'polygon',
      points: [plotPoint(-w, -d), plotPoint(w, -d), plotPoint(w, d), plotPoint(-w, d)],
      part: 'shell',
      stroke: 'ink',
      fill: 'sheet',
      weight: 'bold',
    },
    ...[-1, 1].map((side): Shape => ({
      shape: 'line',
      from: plotPoint(-w, side * (d - hoopDepthM)),
      to: plotPoint(w, side * (d - hoopDepthM)),
      part: 'hoop',
      stroke: 'ink',
      weight: 'hair',
    })),
  ]
}
