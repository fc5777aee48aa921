import { readFileSync, readdirSync, statSync } from 'node:fs'
import { fileURLToPath } from 'node:url'
import { describe, expect, it } from 'vitest'

/**
 * The recorded taps are what their README says, by a WAV header read and a Fourier sum written here and used nowhere else.
 */
const folder = fileURLToPath(new URL('../fixtures/taps/', import.meta.url))

function samplesOf(name: string): { samples: Int16Array; sampleRateHz: number } {
  const bytes = readFileSync(`${folder}${name}`)
  expect([bytes.toString('latin1', 0, 4), bytes.toString('latin1', 8, 16)]).toEqual(['RIFF', 'WAVEfmt '])
  expect([bytes.readUInt16LE(20), bytes.readUInt16LE(22), bytes.readUInt16LE(34)], 'PCM, mono, 16 bit').toEqual([
    1, 1, 16,
  ])
  const count = bytes.readUInt32LE(40) / 2
  return {
    sampleRateHz: bytes.readUInt32LE(24),
    samples: Int16Array.from({ length: count }, (_, i) => bytes.readInt16LE(44 + 2 * i)),
  }
}

/** Frequency in Hz of the largest Hann-windowed Fourier sum between 40 and 600 Hz, to 0.02 Hz. */
function strongestHz(samples: Int16Array, sampleRateHz: number, from: number, to: number): number {
  const first = Math.round(from * sampleRateHz)
  const count = Math.round((to - from) * sampleRateHz)
  const windowed = Array.from(
    { length: count },
    (_, i) => (samples[first + i] ?? 0) * (0.5 - 0.5 * Math.cos((2 * Math.PI * i) / (count - 1))),
  )
  const power = (hz: number) => {
    const turn = (2 * Math.PI * hz) / sampleRateHz
    let [re, im] = [0, 0]
    windowed.forEach((value, i) => {
      re += value * Math.cos(turn * i)
      im += value * Math.sin(turn * i)
    })
    return re * re + im * im
  }
  const strongest = (low: number, high: number, step: number) => {
    let [best, most] = [low, 0]
    for (let hz = low; hz <= high; hz += step) {
      const here = power(hz)
      if (here > most) [best, most] = [hz, here]
    }
    return best
  }
  const near = strongest(40, 600, 2)
  const nearer = strongest(near - 2, near + 2, 0.1)
  return strongest(nearer - 0.1, nearer + 0.1, 0.02)
}

describe('recorded taps', () => {
  // Measured: 0.6 s from 40 ms after the strike. The toms glide, so 10 ms more or less moves the figure by 0.1 Hz.
  it.each([
    ['tom-hi-soft', 153.4],
    ['tom-hi-hard', 153.4],
    ['tom-mid-soft', 121.9],
    ['tom-mid-hard', 122.3],
    ['tom-lo-soft', 92.3],
    ['tom-lo-hard', 92.7],
  ])('%s has its strongest partial at %f Hz (measured)', (name, hz) => {
    const { samples, sampleRateHz } = samplesOf(`${name}.wav`)
    expect(Math.abs(strongestHz(samples, sampleRateHz, 0.04, 0.64) - hz)).toBeLessThan(0.15)
  })

  it('are 16-bit mono at 44.1 kHz, a second at most, two megabytes together', () => {
    const names = readdirSync(folder).filter((name) => name.endsWith('.wav'))
    expect(names).toHaveLength(15)
    for (const name of names) {
      const { samples, sampleRateHz } = samplesOf(name)
      expect(sampleRateHz).toBe(44_100)
      expect(samples.length, name).toBeLessThanOrEqual(44_100)
    }
    expect(names.reduce((sum, name) => sum + statSync(`${folder}${name}`).size, 0)).toBeLessThan(2_000_000)
  })
})
