import type { BandTurns } from './damped-spectrum'
import { dampedSpectrum } from './damped-spectrum'
import { gramOf, leastSquares } from './least-squares'
import type { Complex, ModelKind } from './partial-shape'
import { parametersOf, voicesOf } from './partial-shape'
import { solveSymmetric } from './solve-symmetric'
import type { Spectrum } from './spectrum'
import { turnTable } from './turn-table'

export type BandFit = {
  kind: ModelKind
  /** The model's free parameters, a sample: see {@link voicesOf}. */
  parameters: Float64Array
  /** One complex amplitude a voice: the voice is Re(A·…) at sample 0. */
  amplitudes: Complex[]
  /** Covariance of the parameters and then of each amplitude's real and imaginary part, row by row. */
  covariance: Float64Array
  /** What is left in the band, Σ|R_k|². */
  residual: number
  /** What was in the band, Σ|X_k|². */
  energy: number
  /** Variance of the noise a sample, from what is left. */
  noiseVariance: number
  /** Real numbers that the band holds for certain, at size/count bins for each independent one. */
  freedom: number
}

/** Bins `first` to `last`, both included. */
export type Band = { first: number; last: number }

type Solved = {
  amplitudes: Complex[]
  residual: number
  left: Float64Array
  /** Columns of derivatives: the free parameters, then real and imaginary amplitude of each voice. */
  columns: Float64Array[]
}

const MOST_ROUNDS = 30
const MOST_REFUSED = 6
/** A round that gains less than this in twice the log likelihood is the last. */
const LEAST_GAIN = 1e-4
const MOST_DECAY = 0.2
/** Past this the pitch would fall by octaves. */
const MOST_GLIDE = 6

/**
 * Least squares, which is maximum likelihood in white noise, of damped sinusoids to a band of a spectrum. The transform of a damped
 * sinusoid of N samples is known in closed form, (1 − e^{sN}W^{kN})/(1 − e^s·W^k), so nothing is approximated by taking a band of
 * bins, and the image at negative frequencies is part of the model. Amplitudes are solved for at every step (variable projection),
 * decays and angles moved by Gauss–Newton with Marquardt's damping.
 */
export class BandFitter {
  private readonly bins: number
  private readonly data: Float64Array
  private readonly turns: BandTurns
  private readonly energy: number
  private readonly leastAngle: number
  private readonly mostAngle: number
  /** Independent real numbers in the band. */
  readonly freedom: number

  constructor(
    private readonly spectrum: Spectrum,
    band: Band,
  ) {
    this.leastAngle = (2 * Math.PI * band.first) / spectrum.size
    this.mostAngle = (2 * Math.PI * band.last) / spectrum.size
    this.bins = band.last - band.first + 1
    this.data = new Float64Array(2 * this.bins)
    const turn = new Float64Array(2 * this.bins)
    const turnAll = new Float64Array(2 * this.bins)
    this.turns = { turn, turnAll, count: spectrum.count }
    const { cos, sin } = turnTable(spectrum.size)
    let energy = 0
    for (let i = 0; i < this.bins; i++) {
      const k = band.first + i
      const re = spectrum.re[k] ?? 0
      const im = spectrum.im[k] ?? 0
      this.data[2 * i] = re
      this.data[2 * i + 1] = im
      energy += re * re + im * im
      const whole = (k * spectrum.count) % spectrum.size
      turn[2 * i] = cos[k] ?? 0
      turn[2 * i + 1] = sin[k] ?? 0
      turnAll[2 * i] = cos[whole] ?? 0
      turnAll[2 * i + 1] = sin[whole] ?? 0
    }
    this.energy = energy
    this.freedom = (2 * this.bins * spectrum.count) / spectrum.size
  }

  /** What is left in the band, Σ|R_k|², with the best amplitudes at these parameters; null when the voices cannot be told apart. */
  residualAt(kind: ModelKind, parameters: Float64Array): number | null {
    return this.amplitudesAt(kind, parameters, 0)?.residual ?? null
  }

  /** What is left in each bin of the band, real and imaginary parts in turn; null when the voices cannot be told apart. */
  restAt(kind: ModelKind, parameters: Float64Array): Float64Array | null {
    return this.amplitudesAt(kind, parameters, 0)?.left ?? null
  }

  /**
   * The best fit of a model.
   * @param start first guess of its free parameters, then of those of its neighbours
   * @returns null when the voices cannot be told apart
   */
  fit(kind: ModelKind, start: Float64Array): BandFit | null {
    let parameters = this.within(start, kind)
    let now = this.solve(kind, parameters)
    if (now === null) return null
    let damping = 1e-3
    let refused = 0
    for (let round = 0; round < MOST_ROUNDS && refused < MOST_REFUSED; round++) {
      const step = leastSquares(now.columns, now.left, damping)
      if (step === null) return null
      const moved = parameters.map((value, i) => value + (step[i] ?? 0))
      const next = this.within(moved, kind)
      const then = this.solve(kind, next)
      if (then !== null && then.residual < now.residual) {
        const gained = this.freedom * Math.log(now.residual / then.residual)
        parameters = next
        now = then
        refused = 0
        damping = Math.max(1e-9, damping / 8)
        if (gained < LEAST_GAIN) break
      } else {
        damping *= 10
        refused++
      }
    }
    return this.finish(kind, now, parameters)
  }

  /** Angles stay in the band, decays between twenty windows and some samples. */
  private within(parameters: Float64Array, kind: ModelKind): Float64Array {
    const kept = Float64Array.from(parameters)
    const hold = (at: number, least: number, most: number) => {
      kept[at] = Math.min(most, Math.max(least, kept[at] ?? 0))
    }
    const own = parametersOf[kind]
    const neighbours = Array.from({ length: (kept.length - own) / 2 }, (_, i) => own + 2 * i)
    for (const at of kind === 'two' ? [0, 2, ...neighbours] : [0, ...neighbours]) {
      hold(at, 1 / (20 * this.spectrum.count), MOST_DECAY)
      hold(at + 1, this.leastAngle, this.mostAngle)
    }
    if (kind === 'envelope') hold(2, this.leastAngle - this.mostAngle, this.mostAngle - this.leastAngle)
    if (kind === 'glide') hold(2, -MOST_GLIDE, MOST_GLIDE)
    return kept
  }

  private amplitudesAt(kind: ModelKind, parameters: Float64Array, free: number) {
    const shapes = voicesOf(kind, parameters).map((terms) => dampedSpectrum(terms, free, this.turns))
    const rows = 2 * this.bins
    const linear = shapes.flatMap(({ direct, image }) => {
      const real = new Float64Array(rows)
      const imaginary = new Float64Array(rows)
      const u = direct[0] ?? real
      const v = image[0] ?? real
      for (let i = 0; i < rows; i += 2) {
        const ur = u[i] ?? 0
        const ui = u[i + 1] ?? 0
        const vr = v[i] ?? 0
        const vi = v[i + 1] ?? 0
        real[i] = (ur + vr) / 2
        real[i + 1] = (ui + vi) / 2
        imaginary[i] = -(ui - vi) / 2
        imaginary[i + 1] = (ur - vr) / 2
      }
      return [real, imaginary]
    })
    const solved = leastSquares(linear, this.data, 1e-14)
    if (solved === null) return null
    const left = Float64Array.from(this.data)
    linear.forEach((column, c) => {
      const size = solved[c] ?? 0
      for (let i = 0; i < rows; i++) left[i] = (left[i] ?? 0) - size * (column[i] ?? 0)
    })
    let residual = 0
    for (const value of left) residual += value * value
    const amplitudes = shapes.map((_, j) => ({ re: solved[2 * j] ?? 0, im: solved[2 * j + 1] ?? 0 }))
    return { shapes, linear, left, residual, amplitudes }
  }

  /** The best amplitudes at these parameters, and the derivatives there. */
  private solve(kind: ModelKind, parameters: Float64Array): Solved | null {
    const free = parameters.length
    const solved = this.amplitudesAt(kind, parameters, free)
    if (solved === null) return null
    const { shapes, linear, left, residual, amplitudes } = solved
    const rows = 2 * this.bins
    const nonlinear = Array.from({ length: free }, (_, f) => {
      const column = new Float64Array(rows)
      shapes.forEach(({ direct, image }, j) => {
        const { re, im } = amplitudes[j] ?? { re: 0, im: 0 }
        const u = direct[f + 1]
        const v = image[f + 1]
        if (u === undefined || v === undefined) return
        for (let i = 0; i < rows; i += 2) {
          const ur = u[i] ?? 0
          const ui = u[i + 1] ?? 0
          const vr = v[i] ?? 0
          const vi = v[i + 1] ?? 0
          column[i] = (column[i] ?? 0) + (re * (ur + vr) - im * (ui - vi)) / 2
          column[i + 1] = (column[i + 1] ?? 0) + (re * (ui + vi) + im * (ur - vr)) / 2
        }
      })
      return column
    })
    return { amplitudes, residual, left, columns: [...nonlinear, ...linear] }
  }

  private finish(kind: ModelKind, now: Solved, parameters: Float64Array): BandFit | null {
    const n = now.columns.length
    const { size } = this.spectrum
    const { freedom } = this
    // By Parseval a real sound's energy is 2/size times that of its bins at positive frequencies.
    const variance = ((now.residual / size) * 2) / Math.max(1, freedom - n)
    const { gram, scale } = gramOf(now.columns)
    for (let i = 0; i < n; i++) gram[i * n + i] = (gram[i * n + i] ?? 0) + 1e-13
    const unit = Array.from({ length: n }, (_, i) => Float64Array.from({ length: n }, (_, j) => (i === j ? 1 : 0)))
    const inverse = solveSymmetric(gram, n, unit)
    if (inverse === null) return null
    const covariance = new Float64Array(n * n)
    for (let i = 0; i < n; i++) {
      for (let j = 0; j < n; j++) {
        covariance[i * n + j] = ((inverse[i]?.[j] ?? 0) * variance * size) / (2 * (scale[i] ?? 1) * (scale[j] ?? 1))
      }
    }
    return {
      kind,
      parameters,
      amplitudes: now.amplitudes,
      covariance,
      residual: now.residual,
      energy: this.energy,
      noiseVariance: variance,
      freedom,
    }
  }
}
