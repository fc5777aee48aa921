import { describe, expect, it } from 'vitest'
import { dateWords, instantWords, whenWords, windowWords } from './when-words'

describe('times on paper', () => {
  it('are the venue’s, with the zone beside them', () => {
    expect(dateWords('2031-10-14')).toBe('Tue 14 Oct 2031')
    expect(whenWords('2031-10-14', '20:30', 'Europe/Paris')).toBe('Tue 14 Oct 2031, 20:30 (Europe/Paris)')
    expect(whenWords('2031-10-14', '00:15', 'Europe/Paris', 1)).toBe('Tue 14 Oct 2031, 00:15 +1 day (Europe/Paris)')
    expect(whenWords('2031-10-14', '20:30', null)).toBe('Tue 14 Oct 2031, 20:30 (time zone not known yet)')
    expect(whenWords('2031-10-14', null, 'Europe/Paris')).toBe('Tue 14 Oct 2031')
  })

  it('put an instant on the wall clock of the place', () => {
    // Central European Summer Time is UTC+2, standard time UTC+1.
    expect(instantWords('2031-10-02T16:00:00.000Z', 'Europe/Paris')).toBe('Thu 2 Oct 2031, 18:00 (Europe/Paris)')
    expect(instantWords('2031-12-02T23:30:00.000Z', 'Europe/Paris')).toBe('Wed 3 Dec 2031, 00:30 (Europe/Paris)')
    expect(instantWords('2031-10-02T16:00:00.000Z', null)).toBe('Thu 2 Oct 2031, 16:00 (UTC)')
  })

  it('say a window by whichever end is known', () => {
    expect(windowWords('2031-10-14', '10:00', '12:00', 'Europe/Oslo')).toBe(
      'Tue 14 Oct 2031, 10:00 to 12:00 (Europe/Oslo)',
    )
    expect(windowWords('2031-10-14', null, '12:00', 'Europe/Oslo')).toBe('Tue 14 Oct 2031, until 12:00 (Europe/Oslo)')
    expect(windowWords('2031-10-14', '10:00', null, 'Europe/Oslo')).toBe('Tue 14 Oct 2031, from 10:00 (Europe/Oslo)')
    expect(windowWords('2031-10-14', null, null, 'Europe/Oslo')).toBe('Tue 14 Oct 2031')
  })
})
