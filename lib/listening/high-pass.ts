/** Two Butterworth sections make 24 dB an octave. */
const SECTION_QS = [0.541196, 1.306563]

/** The sound above a cut, 24 dB an octave, sample by sample (bilinear transform). */
export class HighPass {
  private readonly sections: Section[]

  /** @param cutHz under half the sample rate */
  constructor(sampleRateHz: number, cutHz: number) {
    this.sections = SECTION_QS.map((q) => new Section(sampleRateHz, cutHz, q))
  }

  next(value: number): number {
    let passed = value
    for (const section of this.sections) passed = section.next(passed)
    return passed
  }
}

/**
 * The stretch from `from` (included) to `to` (not) above `cutHz`, as a {@link HighPass} that was at rest before it passes it.
 * @param cutHz under half the sample rate
 */
export function highPass(
  samples: Float32Array,
  from: number,
  to: number,
  sampleRateHz: number,
  cutHz: number,
): Float32Array {
  const filter = new HighPass(sampleRateHz, cutHz)
  return samples.slice(from, to).map((value) => filter.next(value))
}

class Section {
  private readonly b0: number
  private readonly b1: number
  private readonly a1: number
  private readonly a2: number
  private x1 = 0
  private x2 = 0
  private y1 = 0
  private y2 = 0

  constructor(sampleRateHz: number, cutHz: number, q: number) {
    const w = (2 * Math.PI * cutHz) / sampleRateHz
    const alpha = Math.sin(w) / (2 * q)
    const cos = Math.cos(w)
    const a0 = 1 + alpha
    this.b0 = (1 + cos) / 2 / a0
    this.b1 = -(1 + cos) / a0
    this.a1 = (-2 * cos) / a0
    this.a2 = (1 - alpha) / a0
  }

  next(x: number): number {
    const y = this.b0 * x + this.b1 * this.x1 + this.b0 * this.x2 - this.a1 * this.y1 - this.a2 * this.y2
    this.x2 = this.x1
    this.x1 = x
    this.y2 = this.y1
    this.y1 = y
    return y
  }
}
