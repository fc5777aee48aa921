import { analyseStrike } from './analyse-strike'
import { checkSampleRate, checkSamples, checkTapOptions } from './check-sound'
import { HighPass } from './high-pass'
import { LONGEST_RING_S } from './hear-strike'
import { STEP } from './strike-onset'
import type { TapOptions, TapReport } from './tap-report'

/** One strike in a stream. Its `onsetS` counts from the stream's first sample. */
export type HeardTap = {
  report: TapReport
  /** From the strike to the sample at which the report was ready, s: no more than 1.25. */
  latencyS: number
}

/** Strikes are looked for above this, Hz: below it a room's noise swells as fast as a strike does. */
const SHARP_HZ = 150
/** Mean squares. The floor is never taken to be under −70 dB of full scale. */
const LEAST_FLOOR = 1e-7
/** What a strike must stand over: the floor, and everything from 16 to 4 ms before. */
const OVER_FLOOR = 8
const RISE = 4
const LOOK_BACK = 12
const GAP = 3
/** The floor falls to what is heard in some 10 ms and climbs by 6 dB a second. */
const FALL = 0.2
const CLIMB_A_SECOND = 4
/** Nor is it one when it is much fainter than what was heard just before; that is forgotten by 30 dB a second. */
const BESIDE_LOUDEST = 0.02
const FORGET_A_SECOND = 1e-3
/** Kept from before the strike, s. */
const PRE_ROLL_S = 0.02
/** A strike that comes later than this into a ring ends it and begins its own; sooner, the two are one double hit. */
const NEXT_STRIKE_S = 0.35
/** A ring is over when it has been this quiet for a tenth of a second. */
const SHORTEST_LISTEN_S = 0.3
const OVER_FOR_S = 0.1
const OVER_FLOOR_AT_END = 1.5
const OVER_LOUDEST_AT_END = 1e-5
/** What a stream begins with may have begun before it: if it is no tap, it is not worth a word. */
const BEGINNING_S = 0.05

type Capture = { at: number; quiet: number; loudest: number; lastLoud: number }

/**
 * Hears taps in a live stream, whatever the size of its frames: decisions fall at every 64th sample of the stream, so that
 * a stream cut anywhere gives the same reports as the whole recording at once. Keeps no more than a second and a half of sound.
 */
export class TapListener {
  private readonly kept: Float32Array
  /** Samples pushed so far, and how many of them have been judged. */
  private pushed = 0
  private judged = 0
  private floor = LEAST_FLOOR
  /** The same of the sharp part, in which strikes are looked for, and what was heard of it lately. */
  private sharpFloor = LEAST_FLOOR
  private loudest = 0
  private readonly recent = new Float64Array(LOOK_BACK + GAP)
  private readonly sharpPart: HighPass
  private sharp = 0
  private capture: Capture | null = null

  /** @throws AcousticsError rate other than 44 100 or 48 000, an option out of its range */
  constructor(
    private readonly sampleRateHz: number,
    private readonly options: TapOptions = {},
  ) {
    checkSampleRate(sampleRateHz)
    checkTapOptions(options)
    this.sharpPart = new HighPass(sampleRateHz, SHARP_HZ)
    this.kept = new Float32Array(STEP * Math.ceil(((LONGEST_RING_S + 0.3) * sampleRateHz) / STEP))
  }

  /** The next frames of the stream. @throws AcousticsError a sample that is not a finite number; nothing of the frames is taken then */
  push(frames: Float32Array): HeardTap[] {
    checkSamples(frames)
    const heard: HeardTap[] = []
    for (const value of frames) {
      this.kept[this.pushed % this.kept.length] = value
      this.pushed++
      this.sharp += this.sharpPart.next(value) ** 2 / STEP
      if (this.pushed - this.judged === STEP) heard.push(...this.judge())
    }
    return heard
  }

  /** The stream is over: what is still ringing is judged as far as it was heard. */
  end(): HeardTap[] {
    const capture = this.capture
    this.capture = null
    return capture === null ? [] : this.close(capture, this.pushed)
  }

  private judge(): HeardTap[] {
    const from = this.judged
    this.judged += STEP
    let loudness = 0
    for (let i = from; i < this.judged; i++) loudness += this.at(i) ** 2 / STEP
    const sharpness = this.sharp
    this.sharp = 0
    const isStrike = this.isStrike(sharpness)
    const heard: HeardTap[] = []
    const { capture } = this
    if (capture !== null) {
      const sinceS = (from - capture.at) / this.sampleRateHz
      if (isStrike && sinceS > NEXT_STRIKE_S) {
        this.capture = null
        heard.push(...this.close(capture, from - STEP))
      } else {
        capture.loudest = Math.max(capture.loudest, loudness)
        const over = Math.max(OVER_FLOOR_AT_END * capture.quiet, OVER_LOUDEST_AT_END * capture.loudest)
        if (loudness > over) capture.lastLoud = this.judged
        const isOver = sinceS > SHORTEST_LISTEN_S && this.judged - capture.lastLoud > OVER_FOR_S * this.sampleRateHz
        if (isOver || sinceS > LONGEST_RING_S) {
          this.capture = null
          heard.push(...this.close(capture, this.judged))
        }
      }
    }
    if (this.capture === null && isStrike) {
      this.capture = { at: Math.max(0, from - STEP), quiet: this.floor, loudest: loudness, lastLoud: this.judged }
    }
    this.follow(loudness, sharpness)
    return heard
  }

  private isStrike(sharpness: number): boolean {
    if (sharpness < OVER_FLOOR * this.sharpFloor || sharpness < BESIDE_LOUDEST * this.loudest) return false
    let before = 0
    for (let i = 0; i < LOOK_BACK; i++) before = Math.max(before, this.recent[i] ?? 0)
    return sharpness > RISE * before
  }

  private follow(loudness: number, sharpness: number): void {
    this.recent.copyWithin(0, 1)
    this.recent[this.recent.length - 1] = sharpness
    this.loudest = Math.max(sharpness, this.loudest * FORGET_A_SECOND ** (STEP / this.sampleRateHz))
    this.floor = this.followed(this.floor, loudness)
    this.sharpFloor = this.followed(this.sharpFloor, sharpness)
  }

  private followed(floor: number, level: number): number {
    const climb = CLIMB_A_SECOND ** (STEP / this.sampleRateHz)
    return Math.max(LEAST_FLOOR, level < floor ? floor + FALL * (level - floor) : Math.min(level, floor * climb))
  }

  private close({ at, quiet }: Capture, end: number): HeardTap[] {
    const from = Math.max(0, at - Math.round(PRE_ROLL_S * this.sampleRateHz))
    const samples = Float32Array.from({ length: end - from }, (_, i) => this.at(from + i))
    const onsetS = at / this.sampleRateHz
    const strike = { samples, sampleRateHz: this.sampleRateHz, strikeAt: at - from, quiet, onsetS }
    const report = analyseStrike(strike, this.options)
    if (report.outcome === 'refused' && onsetS < BEGINNING_S) return []
    return [{ report, latencyS: (end - at) / this.sampleRateHz }]
  }

  private at(index: number): number {
    return this.kept[index % this.kept.length] ?? 0
  }
}
