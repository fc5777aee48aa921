import { expect, it } from 'vitest'
import { dateAfter, datesOf, dateWords, daysBetween } from './calendar'

it('a span holds both its ends, over the end of a month and a leap day', () => {
  expect(datesOf('2028-02-27', '2028-03-01')).toEqual(['2028-02-27', '2028-02-28', '2028-02-29', '2028-03-01'])
  expect(datesOf('2026-10-12', '2026-10-12')).toEqual(['2026-10-12'])
  expect(datesOf('2026-10-12', '2026-10-11')).toEqual([])
})

it('a day is a day where clocks change', () => {
  expect(dateAfter('2026-10-24', 2)).toBe('2026-10-26')
  expect(daysBetween('2026-03-28', '2026-03-30')).toBe(2)
  expect(daysBetween('2026-03-30', '2026-03-28')).toBe(-2)
})

it('says a date as a crew does', () => {
  expect(dateWords('2026-10-15')).toBe('Thu 15 Oct')
})
