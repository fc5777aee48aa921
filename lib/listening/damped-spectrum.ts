import type { Complex, Term } from './partial-shape'

/** Columns of numbers; none where all would be zero. */
export type Columns = (Float64Array | undefined)[]

/** The bins of a band: e^{−2πik/size} of each, and its power of `count`; real and imaginary parts in turn. */
export type BandTurns = { turn: Float64Array; turnAll: Float64Array; count: number }

const still: Complex = { re: 0, im: 0 }

/**
 * Spectrum of a voice over the bins of a band (index 0) and its derivative to each free parameter that it moves with; `image` with
 * every s and c conjugated. A term c·e^{sn} of N samples has the transform c·(1 − e^{sN}W^{kN})/(1 − e^s·W^k).
 */
export function dampedSpectrum(terms: Term[], free: number, band: BandTurns): { direct: Columns; image: Columns } {
  const moves = (f: number) => terms.some(({ toS, toC }) => !isStill(toS[f]) || !isStill(toC[f]))
  const make = () =>
    Array.from({ length: free + 1 }, (_, i) =>
      i === 0 || moves(i - 1) ? new Float64Array(band.turn.length) : undefined,
    )
  const direct = make()
  const image = make()
  for (const term of terms) {
    addTerm(direct, term, 1, band)
    addTerm(image, term, -1, band)
  }
  return { direct, image }
}

function addTerm(into: Columns, { s, c, toS, toC }: Term, sign: 1 | -1, { turn, turnAll, count }: BandTurns): void {
  const size = Math.exp(s.re)
  const zr = size * Math.cos(s.im)
  const zi = sign * size * Math.sin(s.im)
  const sizeAll = Math.exp(s.re * count)
  const ar = sizeAll * Math.cos(s.im * count)
  const ai = sign * sizeAll * Math.sin(s.im * count)
  const cr = c.re
  const ci = sign * c.im
  const shape = into[0]
  const derivatives = into.slice(1).flatMap((column, f) => {
    const ds = toS[f] ?? still
    const dc = toC[f] ?? still
    if (column === undefined) return []
    const dsi = sign * ds.im
    return [{ column, kr: cr * ds.re - ci * dsi, ki: cr * dsi + ci * ds.re, cr: dc.re, ci: sign * dc.im }]
  })
  for (let i = 0; i < turn.length; i += 2) {
    const wr = turn[i] ?? 0
    const wi = turn[i + 1] ?? 0
    const er = zr * wr - zi * wi
    const ei = zr * wi + zi * wr
    const vr = turnAll[i] ?? 0
    const vi = turnAll[i + 1] ?? 0
    const fr = ar * vr - ai * vi
    const fi = ar * vi + ai * vr
    const dr = 1 - er
    const di = -ei
    const over = 1 / (dr * dr + di * di)
    // S = (1 − f)/(1 − e)
    const nr = 1 - fr
    const ni = -fi
    const Sr = (nr * dr + ni * di) * over
    const Si = (ni * dr - nr * di) * over
    // dS/ds = (S·e − N·f)/(1 − e)
    const pr = Sr * er - Si * ei - count * fr
    const pi = Sr * ei + Si * er - count * fi
    const Dr = (pr * dr + pi * di) * over
    const Di = (pi * dr - pr * di) * over
    if (shape !== undefined) {
      shape[i] = (shape[i] ?? 0) + cr * Sr - ci * Si
      shape[i + 1] = (shape[i + 1] ?? 0) + cr * Si + ci * Sr
    }
    for (const { column, kr, ki, cr: br, ci: bi } of derivatives) {
      column[i] = (column[i] ?? 0) + kr * Dr - ki * Di + br * Sr - bi * Si
      column[i + 1] = (column[i + 1] ?? 0) + kr * Di + ki * Dr + br * Si + bi * Sr
    }
  }
}

function isStill(slope: Complex = still): boolean {
  return slope.re === 0 && slope.im === 0
}
