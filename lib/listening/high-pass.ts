/**
 * The sound above `cutHz`, 24 dB an octave (two Butterworth sections, bilinear transform).
 * @param cutHz under half the sample rate
 */
export function highPass(
  samples: Float32Array,
  from: number,
  to: number,
  sampleRateHz: number,
  cutHz: number,
): Float32Array {
  let sound: Float32Array = samples.slice(from, to)
  for (const q of [0.541196, 1.306563]) sound = section(sound, sampleRateHz, cutHz, q)
  return sound
}

function section(sound: Float32Array, sampleRateHz: number, cutHz: number, q: number): Float32Array {
  const w = (2 * Math.PI * cutHz) / sampleRateHz
  const alpha = Math.sin(w) / (2 * q)
  const cos = Math.cos(w)
  const a0 = 1 + alpha
  const b0 = (1 + cos) / 2 / a0
  const b1 = -(1 + cos) / a0
  const a1 = (-2 * cos) / a0
  const a2 = (1 - alpha) / a0
  const out = new Float32Array(sound.length)
  let x1 = 0
  let x2 = 0
  let y1 = 0
  let y2 = 0
  for (let i = 0; i < sound.length; i++) {
    const x = sound[i] ?? 0
    const y = b0 * x + b1 * x1 + b0 * x2 - a1 * y1 - a2 * y2
    out[i] = y
    x2 = x1
    x1 = x
    y2 = y1
    y1 = y
  }
  return out
}
