import { LOWEST_HZ, HIGHEST_HZ } from './find-partials'
import { LOW_RATE_STEP, lowRate } from './low-rate'
import type { TrackPoint } from './pitch-track'
import { pitchTrack } from './pitch-track'
import { peakOffset, spectrumOf } from './spectrum'
import type { TapGlide } from './tap-report'

export type GlidingPitch = {
  pitchHz: number
  standardErrorHz: number
  t60S: number
  amplitude: number
  glide: TapGlide
}

/** What is listened to of a gliding ring, s after the strike. */
const FROM_S = 0.05
const TO_S = 0.65
const SIZE = 8192
/** The glide's own neighbourhood, and how much of the low sound must lie in it. */
const NEAR_SHARE = 0.1
const LEAST_IN_IT = 0.85
/** The track is followed until it is this far down, power. */
const FAINTEST = 0.003
const FEWEST_POINTS = 6
const LEAST_FALL_CENTS = 10
const MOST_FALL_CENTS = 400
/** How much a falling pitch may seem to climb between two looks, share. */
const CLIMB = 0.025
/** The figure for a pitch that moves is no better than this part of its way. */
const ERROR_SHARE = 0.05

/**
 * Pitch of a ring that falls while it lasts, as a hard hit does: the peak of the Hann-windowed spectrum of 50 to 650 ms, placed by the log
 * parabola, which is where the ring dwells. Null when it is not that: the low sound is not all about one pitch, or the
 * pitch does not fall, or the sound does not die away.
 */
export function glidingPitch(
  samples: Float32Array,
  sampleRateHz: number,
  strikeAt: number,
  end: number,
): GlidingPitch | null {
  const rateHz = sampleRateHz / LOW_RATE_STEP
  const from = strikeAt + Math.round(FROM_S * sampleRateHz)
  const low = lowRate(samples, from, Math.min(end, strikeAt + Math.round(TO_S * sampleRateHz)))
  if (low.length < 0.2 * rateHz) return null
  const windowed = low.map((value, i) => value * Math.sin((Math.PI * (i + 0.5)) / low.length) ** 2)
  const spectrum = spectrumOf(windowed, SIZE)
  const binHz = rateHz / SIZE
  const power = (bin: number) => (spectrum.re[bin] ?? 0) ** 2 + (spectrum.im[bin] ?? 0) ** 2
  let top = Math.ceil(LOWEST_HZ / binHz)
  let all = 0
  for (let bin = top; bin <= HIGHEST_HZ / binHz; bin++) {
    all += power(bin)
    if (power(bin) > power(top)) top = bin
  }
  let near = 0
  for (let bin = Math.ceil(top * (1 - NEAR_SHARE)); bin <= top * (1 + NEAR_SHARE); bin++) near += power(bin)
  if (near < LEAST_IN_IT * all) return null

  const db = (bin: number) => 10 * Math.log10(power(bin) + 1e-30)
  const pitchHz = (top + peakOffset(db(top - 1), db(top), db(top + 1))) * binHz
  const track = pitchTrack(low, rateHz, pitchHz)
  const loudest = Math.max(...track.map(({ amplitude }) => amplitude))
  const cut = track.findIndex(({ amplitude }) => amplitude ** 2 < FAINTEST * loudest ** 2)
  const heard = cut < 0 ? track : track.slice(0, cut)
  if (heard.length < FEWEST_POINTS) return null
  const third = Math.floor(heard.length / 3)
  const startHz = middleOf(heard.slice(0, Math.max(2, Math.floor(third / 2))))
  const settledHz = middleOf(heard.slice(-third))
  const cents = 1200 * Math.log2(startHz / settledHz)
  const climbs = heard.some(({ hz }, i) => i > 0 && hz > (heard[i - 1]?.hz ?? hz) * (1 + CLIMB))
  const [first, last] = [heard[0], heard[heard.length - 1]]
  if (first === undefined || last === undefined || cents < LEAST_FALL_CENTS || cents > MOST_FALL_CENTS || climbs)
    return null
  const dropDb = 20 * Math.log10(loudest / last.amplitude)
  if (dropDb < 6) return null
  return {
    pitchHz,
    standardErrorHz: ERROR_SHARE * Math.abs(startHz - settledHz),
    t60S: (60 / dropDb) * (last.atS - first.atS),
    amplitude: loudest,
    glide: { cents, settledHz },
  }
}

function middleOf(points: TrackPoint[]): number {
  const sorted = points.map(({ hz }) => hz).sort((a, b) => a - b)
  return sorted[sorted.length >> 1] ?? 0
}
