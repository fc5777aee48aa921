import { round } from './round'

/** A point at `radius` and `angleRad` clockwise from twelve o'clock, y downwards as SVG has it. */
export function clockPoint(angleRad: number, radius: number): { x: number; y: number } {
  return { x: round(Math.sin(angleRad) * radius), y: round(-Math.cos(angleRad) * radius) }
}
