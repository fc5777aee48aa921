/** Samples a step of the loudness curve: 1.3 ms at 48 kHz. */
export const STEP = 64
/** Nothing over this ever: silence, −66 dB of full scale. */
const SILENT_PEAK = 5e-4
/** A strike's first step holds at least this part of its loudest one. */
const STRIKE_SHARE = 0.1
/** And stands this many times over the quiet. */
const OVER_QUIET = 4

export type StrikeOnset = { kind: 'found'; at: number; quiet: number } | { kind: 'silent' } | { kind: 'steady' }

/** Mean square of each whole step of samples. */
export function loudnessCurve(samples: Float32Array, from = 0, to = samples.length): Float64Array {
  const steps = new Float64Array(Math.floor((to - from) / STEP))
  for (let i = 0; i < steps.length; i++) {
    let sum = 0
    for (let j = 0; j < STEP; j++) sum += (samples[from + i * STEP + j] ?? 0) ** 2
    steps[i] = sum / STEP
  }
  return steps
}

/**
 * Where the first strike of a clip begins: the first step that comes near the loudest one and stands over the quiet, which is the
 * clip's own lower fifth. `steady`: as loud throughout, so nothing was struck.
 */
export function strikeOnset(samples: Float32Array): StrikeOnset {
  let peak = 0
  for (const value of samples) peak = Math.max(peak, Math.abs(value))
  if (peak < SILENT_PEAK) return { kind: 'silent' }
  const curve = loudnessCurve(samples)
  const sorted = Float64Array.from(curve).sort()
  const loudest = sorted[sorted.length - 1] ?? 0
  const quiet = sorted[Math.floor(sorted.length / 5)] ?? 0
  const bar = Math.max(STRIKE_SHARE * loudest, OVER_QUIET * quiet)
  const step = curve.findIndex((value) => value >= bar)
  if (step < 0) return { kind: 'steady' }
  return { kind: 'found', at: Math.max(0, (step - 1) * STEP), quiet }
}
