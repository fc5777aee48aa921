import { describe, expect, it } from 'vitest'
import { instantOfWallTime, wallTimeOfInstant } from './wall-time'

const utc = (date: string, time: string, zone: string) => instantOfWallTime({ date, time }, zone).toISOString()

describe('a wall time becomes an instant', () => {
  it('by the offset of its date', () => {
    expect(utc('2026-10-02', '18:00', 'Europe/Paris')).toBe('2026-10-02T16:00:00.000Z')
    expect(utc('2026-12-02', '18:00', 'Europe/Paris')).toBe('2026-12-02T17:00:00.000Z')
    expect(utc('2026-12-02', '18:00', 'Asia/Kathmandu')).toBe('2026-12-02T12:15:00.000Z')
  })

  it('a time that the clock skips is moved on by the gap (New York, 11 March 2007)', () => {
    expect(utc('2007-03-11', '02:30', 'America/New_York')).toBe('2007-03-11T07:30:00.000Z')
    expect(utc('2007-03-11', '01:59', 'America/New_York')).toBe('2007-03-11T06:59:00.000Z')
    expect(utc('2007-03-11', '03:00', 'America/New_York')).toBe('2007-03-11T07:00:00.000Z')
  })

  it('a time that comes twice is the first of the two (New York, 4 November 2007)', () => {
    expect(utc('2007-11-04', '01:30', 'America/New_York')).toBe('2007-11-04T05:30:00.000Z')
    expect(utc('2007-11-04', '02:00', 'America/New_York')).toBe('2007-11-04T07:00:00.000Z')
  })

  it('refuses a day that no calendar has and a zone that nobody keeps', () => {
    expect(() => utc('2026-02-30', '10:00', 'Europe/Paris')).toThrow(RangeError)
    expect(() => utc('2026-02-20', '10:00', 'Europe/Arvic')).toThrow(RangeError)
  })
})

describe('an instant as a wall shows it', () => {
  it.each([
    ['2026-10-02T16:00:00Z', 'Europe/Paris', '2026-10-02', '18:00'],
    ['2026-10-02T23:30:00Z', 'Europe/Paris', '2026-10-03', '01:30'],
    ['2007-03-11T07:30:00Z', 'America/New_York', '2007-03-11', '03:30'],
  ])('%s in %s', (instant, zone, date, time) => {
    expect(wallTimeOfInstant(new Date(instant), zone)).toEqual({ date, time })
  })
})
