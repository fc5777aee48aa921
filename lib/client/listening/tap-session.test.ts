import { readFileSync } from 'node:fs'
import { describe, expect, test } from 'vitest'
import { readWav } from '@/lib/listening/read-wav'
import type { TapNews } from './tap-session'
import { TapSession } from './tap-session'

const { samples, sampleRateHz } = readWav(readFileSync('tests/fixtures/taps/tom-hi-soft.wav'))

function frames(session: TapSession, sound: Float32Array): TapNews[] {
  const news: TapNews[] = []
  for (let at = 0; at < sound.length; at += 1024)
    news.push(...session.take({ kind: 'frames', frames: sound.slice(at, at + 1024) }))
  return news
}

describe('what the worker does', () => {
  test('a recorded tom in frames of the sound thread: one tap, the pitch of the plain transform (derived, 153.4 Hz)', () => {
    const session = new TapSession()
    expect(session.take({ kind: 'start', sampleRateHz, options: {} })).toEqual([])
    const room = new Float32Array(sampleRateHz / 2)
    const news = [...frames(session, room), ...frames(session, samples), ...session.take({ kind: 'end' })]
    const taps = news.flatMap((one) => (one.kind === 'tap' ? [one.heard.report] : []))
    expect(taps).toHaveLength(1)
    expect(taps[0]).toMatchObject({ outcome: 'heard' })
    expect(Math.abs((taps[0]?.outcome === 'heard' ? taps[0].pitchHz : 0) - 153.4)).toBeLessThan(0.5)
  })

  test('levels come some twelve times a second and hold the loudest sample', () => {
    const session = new TapSession()
    session.take({ kind: 'start', sampleRateHz: 48_000, options: {} })
    const sound = new Float32Array(48_000)
    sound[30_000] = -0.7
    const levels = frames(session, sound).flatMap((one) => (one.kind === 'level' ? [one.peak] : []))
    expect(levels.length).toBeGreaterThanOrEqual(10)
    expect(levels.length).toBeLessThanOrEqual(12)
    expect(Math.max(...levels)).toBeCloseTo(0.7, 6)
    expect(levels.filter((peak) => peak > 0)).toHaveLength(1)
  })

  test('sound that cannot be read ends with a fault; what comes after it, or before a start, is passed over', () => {
    const session = new TapSession()
    expect(session.take({ kind: 'frames', frames: new Float32Array(64) })).toEqual([])
    expect(session.take({ kind: 'start', sampleRateHz: 16_000, options: {} })).toMatchObject([{ kind: 'fault' }])
    session.take({ kind: 'start', sampleRateHz: 48_000, options: {} })
    expect(session.take({ kind: 'frames', frames: Float32Array.of(Number.NaN) })).toMatchObject([{ kind: 'fault' }])
    expect(session.take({ kind: 'frames', frames: new Float32Array(64) })).toEqual([])
    expect(session.take({ kind: 'end' })).toEqual([])
  })
})
