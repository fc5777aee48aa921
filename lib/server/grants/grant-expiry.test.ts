import { describe, expect, it } from 'vitest'
import { grantExpiry } from './grant-expiry'

const now = new Date('2031-09-01T10:00:00Z')

describe('grantExpiry', () => {
  it('lasts two whole weeks past the last day, by that place’s clock', () => {
    // 14 October + 14 days ends at midnight in Paris, an hour ahead of UTC after the clocks went back on 26 October.
    expect(grantExpiry({ lastDate: '2031-10-14', zone: 'Europe/Paris', now }).toISOString()).toBe('2031-10-28T23:00:00.000Z')
    expect(grantExpiry({ lastDate: '2031-10-14', zone: null, now }).toISOString()).toBe('2031-10-29T00:00:00.000Z')
  })

  it('lasts two weeks from now when the day is past or not known', () => {
    expect(grantExpiry({ lastDate: '2031-01-01', zone: 'Europe/Paris', now }).toISOString()).toBe('2031-09-15T10:00:00.000Z')
    expect(grantExpiry({ lastDate: null, zone: null, now }).toISOString()).toBe('2031-09-15T10:00:00.000Z')
  })
})
