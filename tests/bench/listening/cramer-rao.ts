import type { TapPartial } from '@/lib/listening/tap-partials'

/** What is sounded and how loud the white noise is; the samples run from the strike to `lengthS` after it. */
export type Observed = { partials: readonly TapPartial[]; noiseRms: number; sampleRateHz: number; lengthS: number }

/** Parameters of each partial, in this order. */
const PER_PARTIAL = 4
type Slope = { amplitude: number; hz: number }

/**
 * Least standard deviation (Cramér–Rao) that an unbiased estimator of g can have when amplitude, phase, frequency and decay of every
 * partial are unknown: √(∇gᵀ·F⁻¹·∇g), F = Σ ∂s·∂sᵀ/σ² summed over the samples one by one. All samples from the strike on
 * count, the stick's contact included as if the partials were whole there, so the bound errs to the strict side.
 * @param slopes ∂g/∂amplitude and ∂g/∂hz of each partial
 */
function bound({ partials, noiseRms, sampleRateHz, lengthS }: Observed, slopes: readonly Slope[]): number {
  const size = PER_PARTIAL * partials.length
  const fisher = Array.from({ length: size }, () => new Float64Array(size))
  const slope = new Float64Array(size)
  const states = partials.map(({ hz, decayT60S, phaseRad }) => {
    const decay = (3 * Math.LN10) / decayT60S
    return { decay, turn: 2 * Math.PI * hz, phaseRad, perSample: Math.exp(-decay / sampleRateHz), height: 1 }
  })
  const samples = Math.round(lengthS * sampleRateHz)
  for (let i = 0; i < samples; i++) {
    const t = i / sampleRateHz
    states.forEach((state, k) => {
      const angle = state.turn * t + state.phaseRad
      const amplitude = partials[k]?.amplitude ?? 0
      const sine = state.height * Math.sin(angle)
      const cosine = state.height * amplitude * Math.cos(angle)
      slope[PER_PARTIAL * k] = sine
      slope[PER_PARTIAL * k + 1] = cosine
      slope[PER_PARTIAL * k + 2] = cosine * 2 * Math.PI * t
      slope[PER_PARTIAL * k + 3] = -amplitude * sine * t
      state.height *= state.perSample
    })
    for (let row = 0; row < size; row++) {
      const line = fisher[row] as Float64Array
      const here = slope[row] ?? 0
      for (let column = row; column < size; column++) line[column] = (line[column] ?? 0) + here * (slope[column] ?? 0)
    }
  }
  const gradient = new Float64Array(size)
  slopes.forEach(({ amplitude, hz }, k) => {
    gradient[PER_PARTIAL * k] = amplitude
    gradient[PER_PARTIAL * k + 2] = hz
  })
  return noiseRms * Math.sqrt(quadraticInverse(fisher, gradient))
}

/** gᵀ·F⁻¹·g of a symmetric positive F given by its upper half, by Cholesky's F = RᵀR after scaling the diagonal to 1. */
function quadraticInverse(upper: Float64Array[], gradient: Float64Array): number {
  const size = gradient.length
  const scale = upper.map((line, i) => 1 / Math.sqrt(line[i] ?? 1))
  const at = (i: number, j: number) => (upper[i]?.[j] ?? 0) * (scale[i] ?? 1) * (scale[j] ?? 1)
  const factor = Array.from({ length: size }, () => new Float64Array(size))
  const solved = new Float64Array(size)
  for (let j = 0; j < size; j++) {
    for (let i = 0; i <= j; i++) {
      let sum = at(i, j)
      for (let k = 0; k < i; k++) sum -= (factor[k]?.[i] ?? 0) * (factor[k]?.[j] ?? 0)
      const line = factor[i] as Float64Array
      line[j] = i === j ? Math.sqrt(sum) : sum / (line[i] ?? 1)
    }
    let sum = (gradient[j] ?? 0) * (scale[j] ?? 1)
    for (let k = 0; k < j; k++) sum -= (factor[k]?.[j] ?? 0) * (solved[k] ?? 0)
    solved[j] = sum / (factor[j]?.[j] ?? 1)
  }
  return solved.reduce((sum, value) => sum + value * value, 0)
}

/** Pitch of the partials, Hz: their mean weighted by amplitude. */
export function pitchOf(partials: readonly TapPartial[]): number {
  const weight = partials.reduce((sum, { amplitude }) => sum + amplitude, 0)
  return partials.reduce((sum, { amplitude, hz }) => sum + amplitude * hz, 0) / weight
}

/** Bound on the pitch (`pitchOf`), Hz. */
export function pitchBoundHz(observed: Observed): number {
  const pitch = pitchOf(observed.partials)
  const weight = observed.partials.reduce((sum, { amplitude }) => sum + amplitude, 0)
  return bound(
    observed,
    observed.partials.map(({ amplitude, hz }) => ({ amplitude: (hz - pitch) / weight, hz: amplitude / weight })),
  )
}

/** Bound on how far two partials lie apart, Hz. */
export function splitBoundHz(observed: Observed): number {
  return bound(
    observed,
    observed.partials.map((_, k) => ({ amplitude: 0, hz: k === 0 ? 1 : -1 })),
  )
}
