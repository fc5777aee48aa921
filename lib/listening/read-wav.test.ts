import { readFileSync } from 'node:fs'
import fc from 'fast-check'
import { describe, expect, test } from 'vitest'
import { AcousticsError } from '@/lib/acoustics/acoustics-error'
import { readWav } from './read-wav'

type Written = {
  code?: number
  channels?: number
  rate?: number
  bits?: number
  data: Uint8Array
  stated?: number
  before?: Uint8Array
  extensible?: boolean
}

/** A WAV file byte by byte, as the 1991 specification lays it out. */
function wav({
  code = 1,
  channels = 1,
  rate = 48_000,
  bits = 16,
  data,
  stated,
  before,
  extensible,
}: Written): Uint8Array {
  const frame = (channels * bits) / 8
  const format = extensible
    ? [
        u16(0xfffe),
        u16(channels),
        u32(rate),
        u32(rate * frame),
        u16(frame),
        u16(bits),
        u16(22),
        u16(bits),
        u32(4),
        u16(code),
        new Uint8Array(14),
      ]
    : [u16(code), u16(channels), u32(rate), u32(rate * frame), u16(frame), u16(bits)]
  const body = joined([
    text('WAVE'),
    ...(before === undefined ? [] : [text('LIST'), u32(before.length), before, new Uint8Array(before.length % 2)]),
    text('fmt '),
    u32(joined(format).length),
    ...format,
    text('data'),
    u32(stated ?? data.length),
    data,
  ])
  return joined([text('RIFF'), u32(body.length), body])
}

const text = (word: string) => Uint8Array.from(word, (letter) => letter.charCodeAt(0))
const u16 = (value: number) => Uint8Array.of(value & 255, (value >> 8) & 255)
const u32 = (value: number) =>
  Uint8Array.of(value & 255, (value >>> 8) & 255, (value >>> 16) & 255, (value >>> 24) & 255)

function joined(parts: Uint8Array[]): Uint8Array {
  const whole = new Uint8Array(parts.reduce((sum, part) => sum + part.length, 0))
  let at = 0
  for (const part of parts) {
    whole.set(part, at)
    at += part.length
  }
  return whole
}

function floats(...values: number[]): Uint8Array {
  return new Uint8Array(Float32Array.from(values).buffer)
}

describe('reading WAV', () => {
  test('16 bits: a half is 0x4000, the lowest 0x8000', () => {
    const { samples, sampleRateHz } = readWav(
      wav({ data: Uint8Array.of(0x00, 0x40, 0x00, 0x80, 0xff, 0xff), rate: 44_100 }),
    )
    expect([...samples]).toEqual([0.5, -1, -1 / 32_768])
    expect(sampleRateHz).toBe(44_100)
  })

  test('24 and 32 bits', () => {
    expect([
      ...readWav(wav({ bits: 24, data: Uint8Array.of(0, 0, 0x40, 0, 0, 0x80, 0xff, 0xff, 0xff) })).samples,
    ]).toEqual([0.5, -1, -1 / 2 ** 23])
    expect([...readWav(wav({ bits: 32, data: Uint8Array.of(0, 0, 0, 0x40, 0, 0, 0, 0xe0) })).samples]).toEqual([
      0.5, -0.25,
    ])
  })

  test('floats, and the long form of the format', () => {
    expect([...readWav(wav({ code: 3, bits: 32, data: floats(0.25, -0.75) })).samples]).toEqual([0.25, -0.75])
    expect([...readWav(wav({ code: 3, bits: 32, data: floats(0.25), extensible: true })).samples]).toEqual([0.25])
  })

  test('stereo is the mean of both; chunks before, an odd one among them, are passed over', () => {
    const file = wav({
      code: 3,
      channels: 2,
      bits: 32,
      data: floats(1, 0, -0.5, -0.25),
      before: Uint8Array.of(1, 2, 3),
    })
    expect([...readWav(file).samples]).toEqual([0.5, -0.375])
  })

  test('a length that the recorder did not know is what there is', () => {
    expect([...readWav(wav({ data: Uint8Array.of(0, 0x40), stated: 0xffffffff })).samples]).toEqual([0.5])
  })

  test('a file within a larger buffer, and a recorded one', () => {
    const file = wav({ data: Uint8Array.of(0, 0x40) })
    expect([...readWav(joined([new Uint8Array(7), file]).subarray(7)).samples]).toEqual([0.5])
    const tap = readWav(readFileSync('tests/fixtures/taps/tom-hi-soft.wav'))
    expect([tap.sampleRateHz, tap.samples.length]).toEqual([44_100, 27_740])
  })

  test.each([
    ['nothing at all', new Uint8Array(0), /not a WAV file/],
    ['another kind of file', text('OggS, which is not what is read here'), /not a WAV file/],
    ['no sound chunk', wav({ data: new Uint8Array(0) }).subarray(0, 36), /no sound/],
    ['sound before its format', joined([text('RIFF'), u32(4), text('WAVEdata'), u32(2), u16(0)]), /before its format/],
    ['less sound than stated', wav({ data: Uint8Array.of(1, 2), stated: 4000 }), /ends after 2 bytes/],
    ['8 bits', wav({ bits: 8, data: Uint8Array.of(1) }), /8 bits/],
    ['a compressed kind', wav({ code: 2, data: Uint8Array.of(1, 2) }), /kind 2/],
    ['six channels', wav({ channels: 6, data: new Uint8Array(12) }), /6 channels/],
    ['a rate of nothing', wav({ rate: 0, data: Uint8Array.of(1, 2) }), /rate of 0/],
    ['a sample that is not a number', wav({ code: 3, bits: 32, data: floats(0, Number.NaN) }), /not a finite number/],
  ])('refuses %s', (_, file, message) => {
    expect(() => readWav(file)).toThrow(AcousticsError)
    expect(() => readWav(file)).toThrow(message)
  })

  test('property: damaged anywhere, a file is read or refused, never anything else', () => {
    const whole = wav({ channels: 2, data: new Uint8Array(64), before: Uint8Array.of(9, 9) })
    fc.assert(
      fc.property(fc.nat(whole.length - 1), fc.nat(255), fc.nat(whole.length), (at, value, length) => {
        const damaged = Uint8Array.from(whole)
        damaged[at] = value
        try {
          for (const sample of readWav(damaged.subarray(0, length)).samples)
            expect(Math.abs(sample)).toBeLessThanOrEqual(1)
        } catch (error) {
          expect(error).toBeInstanceOf(AcousticsError)
        }
      }),
      { numRuns: 1000 },
    )
  })
})
