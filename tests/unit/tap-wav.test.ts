import { mkdtempSync, readFileSync, rmSync } from 'node:fs'
import { tmpdir } from 'node:os'
import { join } from 'node:path'
import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import { hearRecording } from '@/lib/listening/hear-recording'
import { readWav } from '@/lib/listening/read-wav'
import { writeTapWav } from '@/tests/helpers/tap-wav'
import type { WrittenTap } from '@/tests/helpers/tap-wav'

/** A head read once round by ear, from file to pitches: the way that a phone's microphone goes. */
describe('taps once round a head in a WAV', () => {
  const film = { plyMils: [10], coatingKgPerM2: 0 }
  const [splitHz, axisRad] = [3, 0.5]
  const folder = mkdtempSync(join(tmpdir(), 'taps-'))
  const path = join(folder, 'taps.wav')
  let written: WrittenTap[]
  beforeAll(() => {
    written = writeTapWav(path, {
      drum: {
        drum: { diameterM: 0.3048, depthM: 0.2032, batter: film, resonant: film },
        tension: { batterNPerM: 1500, resonantNPerM: 1700 },
        struck: 'batter',
        otherHead: 'damped',
        fingerOnCentre: true,
        decayT60S: 0.8,
        splitHz,
        axisRad,
      },
      lugs: 6,
      seed: 3,
    })
  })
  afterAll(() => rmSync(folder, { recursive: true }))

  it('follow p̄ + (Δ/2)·cos 2(θ − θ0) as written (derived)', () => {
    // f11 of the 12 × 8 in tom is 255.32 Hz at 2000 N/m with the other head damped and goes as the root of the tension.
    const middle = 255.32 * Math.sqrt(1500 / 2000)
    written.forEach(({ lug, pitchHz }) => {
      const angle = (2 * Math.PI * (lug - 1)) / 6
      expect(Math.abs(pitchHz - (middle + (splitHz / 2) * Math.cos(2 * (angle - axisRad))))).toBeLessThan(0.1)
    })
  })

  it('are all heard, each where it was struck and within 3 cents of what it sounds', () => {
    const { samples, sampleRateHz } = readWav(readFileSync(path))
    const heard = hearRecording(samples, sampleRateHz, { expectHz: 220 })
    expect(heard).toHaveLength(written.length)
    heard.forEach(({ report }, index) => {
      const tap = written[index] ?? { atS: 0, pitchHz: 1 }
      if (report.outcome !== 'heard') throw new Error(`Tap ${index + 1} was refused: ${report.kind}.`)
      expect(Math.abs(report.onsetS - tap.atS)).toBeLessThan(0.02)
      expect(Math.abs(1200 * Math.log2(report.pitchHz / tap.pitchHz))).toBeLessThan(3)
    })
  })
})
