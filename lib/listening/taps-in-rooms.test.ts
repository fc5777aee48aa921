import { describe, expect, it } from 'vitest'
import { pitchOf } from '@/tests/bench/listening/cramer-rao'
import { goodTap } from '@/tests/bench/listening/good-tap'
import { analyseTap } from './analyse-tap'
import { tapRandom } from './tap-random'
import type { TapReading } from './tap-report'

type InRoom = { shortestT60S: number; longestT60S: number; splitHz: number }

/** Taps in seeded rooms: those that are read, with the pitch that each was made at, and how many are refused. */
function inRooms(seed: number, count: number, { shortestT60S, longestT60S, splitHz }: InRoom) {
  const random = tapRandom(seed)
  const between = (low: number, high: number) => low + (high - low) * random.uniform()
  const read: { reading: TapReading; madeAtHz: number }[] = []
  for (let i = 0; i < count; i++) {
    const tap = goodTap(random, {
      decayT60S: between(shortestT60S, longestT60S),
      splitHz,
      noise: { colour: 'white', snrDb: between(25, 45) },
      room: { reverbT60S: between(0.3, 0.8), share: between(0.1, 0.3) },
      lengthS: 1.2,
    })
    const madeAtHz = pitchOf(tap.tap)
    const expectHz = madeAtHz * 2 ** (between(-200, 200) / 1200)
    const reading = analyseTap(tap.samples, tap.sampleRateHz, { expectHz })
    if (reading.outcome === 'heard') read.push({ reading, madeAtHz })
  }
  return { read, refused: count - read.length }
}

// Derived: the pitch that each tap was made at.
describe('derived: taps in a room of 0.3 to 0.8 s at a tenth to three tenths of the drum', () => {
  const cases = [
    // A short ring drowns in a longer room, so most may be refused.
    { name: 'short taps', seed: 5, mostRefused: 12, made: { shortestT60S: 0.12, longestT60S: 0.3, splitHz: 0 } },
    { name: 'even heads', seed: 6, mostRefused: 5, made: { shortestT60S: 0.3, longestT60S: 1.4, splitHz: 0 } },
    { name: 'split heads', seed: 7, mostRefused: 5, made: { shortestT60S: 0.3, longestT60S: 1.4, splitHz: 5 } },
  ]
  it.each(cases)('$name: none off by 25 cents or 5 stated deviations', ({ seed, mostRefused, made }) => {
    const { read, refused } = inRooms(seed, 16, made)
    for (const { reading, madeAtHz } of read) {
      expect(Math.abs(1200 * Math.log2(reading.pitchHz / madeAtHz))).toBeLessThan(25)
      expect(Math.abs(reading.pitchHz - madeAtHz)).toBeLessThan(5 * reading.standardErrorHz)
    }
    expect(refused).toBeLessThanOrEqual(mostRefused)
  })

  it('a warble is claimed on one even head in eight at most', () => {
    const { read } = inRooms(8, 16, { shortestT60S: 0.4, longestT60S: 1.4, splitHz: 0 })
    expect(read.filter(({ reading }) => reading.warble !== null).length).toBeLessThanOrEqual(2)
    expect(read.length).toBeGreaterThanOrEqual(12)
  })
})
