import { readFileSync } from 'node:fs'
import fc from 'fast-check'
import { describe, expect, test } from 'vitest'
import { AcousticsError } from '@/lib/acoustics/acoustics-error'
import { hearRecording } from './hear-recording'
import { readWav } from './read-wav'
import type { HeardTap } from './tap-listener'
import { TapListener } from './tap-listener'
import { tapRandom } from './tap-random'

const RATE = 44_100
const soft = (name: string) => readWav(readFileSync(`tests/fixtures/taps/${name}.wav`)).samples

/** Sounds laid into a quiet room, each from its second on. */
function session(lengthS: number, ...laid: [atS: number, sound: Float32Array][]): Float32Array {
  const random = tapRandom(11)
  const stream = Float32Array.from({ length: Math.round(lengthS * RATE) }, () => 2e-5 * random.normal())
  for (const [atS, sound] of laid) {
    const from = Math.round(atS * RATE)
    sound.forEach((value, i) => {
      if (from + i < stream.length) stream[from + i] = (stream[from + i] ?? 0) + value
    })
  }
  return stream
}

function ring(hz: number, t60S = 0.6): Float32Array {
  return Float32Array.from(
    { length: RATE },
    (_, i) => 0.3 * 10 ** ((-3 * i) / RATE / t60S) * Math.sin((2 * Math.PI * hz * i) / RATE),
  )
}

const told = (heard: HeardTap[]) =>
  heard.map(({ report }) => (report.outcome === 'heard' ? Math.round(report.pitchHz) : report.kind))

describe('a live stream', () => {
  const evening = session(
    7,
    [0.4, soft('tom-hi-soft')],
    [2, soft('cymbal-soft')],
    [3.7, soft('tom-lo-soft')],
    [5.5, ring(200)],
  )

  test('one report a tap, in order: a tom, a cymbal, another tom, a plain ring', () => {
    expect(told(hearRecording(evening, RATE))).toEqual([153, 'not-a-tap', 92, 200])
  })

  test('each says when it was and is there within a second and a quarter of its strike', () => {
    const heard = hearRecording(evening, RATE)
    const beganS = [0.4, 2, 3.7, 5.5]
    heard.forEach(({ report, latencyS }, i) => {
      expect(Math.abs((report.onsetS ?? 0) - (beganS[i] ?? 0))).toBeLessThan(0.006)
      expect(latencyS).toBeLessThan(1.25)
    })
  })

  test('property: cut anywhere, the stream gives the same as the recording at once', () => {
    const piece = evening.subarray(0, Math.round(3.2 * RATE))
    const whole = JSON.stringify(hearRecording(piece, RATE))
    fc.assert(
      fc.property(fc.array(fc.integer({ min: 0, max: 30_000 }), { minLength: 1, maxLength: 12 }), (sizes) => {
        const listener = new TapListener(RATE)
        const heard: HeardTap[] = []
        for (let at = 0, turn = 0; at < piece.length; turn++) {
          const size = sizes[turn % sizes.length] ?? 0
          // All sizes may be nothing: then one sample keeps it going.
          const next = at + (turn % sizes.length === 0 ? Math.max(1, size) + 500 : size)
          heard.push(...listener.push(piece.subarray(at, next)))
          at = next
        }
        heard.push(...listener.end())
        expect(JSON.stringify(heard)).toBe(whole)
      }),
      { numRuns: 12, seed: 3 },
    )
  })

  test('two strikes across frames are one double hit; half a second apart they are two taps', () => {
    const close = session(2, [0.5, ring(180)], [0.65, ring(180)])
    const listener = new TapListener(RATE)
    const heard: HeardTap[] = []
    for (let at = 0; at < close.length; at += 128) heard.push(...listener.push(close.subarray(at, at + 128)))
    expect(told(heard)).toEqual(['double-hit'])
    expect(told(hearRecording(session(3, [0.5, ring(180, 0.4)], [1.1, ring(240, 0.4)]), RATE))).toEqual([180, 240])
  })

  test('a quiet room, a loud one and hum say nothing', () => {
    const random = tapRandom(2)
    expect(hearRecording(session(3), RATE)).toEqual([])
    expect(
      hearRecording(
        Float32Array.from({ length: 3 * RATE }, () => 0.05 * random.normal()),
        RATE,
      ),
    ).toEqual([])
    expect(
      hearRecording(
        Float32Array.from({ length: 3 * RATE }, (_, i) => 0.1 * Math.sin((2 * Math.PI * 50 * i) / RATE)),
        RATE,
      ),
    ).toEqual([])
  })

  test('a tap is heard over a room that is loud from the start', () => {
    const random = tapRandom(4)
    const stream = session(3, [1.6, ring(210)]).map((value) => value + 0.003 * random.normal())
    expect(told(hearRecording(stream, RATE))).toEqual([210])
  })

  test('what is still ringing at the end is judged as far as it was heard', () => {
    const listener = new TapListener(RATE)
    expect(listener.push(session(1, [0.6, ring(170)]))).toEqual([])
    expect(told(listener.end())).toEqual([170])
    expect(listener.end()).toEqual([])
  })

  test('a tap after two minutes of quiet is placed as well as the first', () => {
    const listener = new TapListener(RATE)
    const quiet = session(10)
    for (let turn = 0; turn < 12; turn++) expect(listener.push(quiet)).toEqual([])
    const [tap] = listener.push(session(2, [0.25, ring(190)]))
    expect(tap?.report).toMatchObject({ outcome: 'heard' })
    expect(Math.abs((tap?.report.onsetS ?? 0) - 120.25)).toBeLessThan(0.006)
  })

  test('broken frames are refused whole, and the stream goes on', () => {
    const listener = new TapListener(RATE)
    const stream = session(2, [0.5, ring(220)])
    listener.push(stream.subarray(0, 20_000))
    expect(() => listener.push(Float32Array.of(0, Number.NaN))).toThrow(AcousticsError)
    expect(told([...listener.push(stream.subarray(20_000)), ...listener.end()])).toEqual([220])
    expect(() => new TapListener(16_000)).toThrow(/sampleRateHz/)
    expect(() => new TapListener(RATE, { expectHz: Number.NaN })).toThrow(/expectHz/)
  })
})
