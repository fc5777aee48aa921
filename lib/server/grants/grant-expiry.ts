import { Temporal } from 'temporal-polyfill'

const daysAfter = 14

/**
 * When a link runs out: two weeks after the last day that it serves (a show's, or a hire's collection), told in the place's own
 * zone, and never sooner than two weeks from now.
 * @param lastDate YYYY-MM-DD, null while it is not known
 */
export function grantExpiry(input: { lastDate: string | null; zone: string | null; now: Date }): Date {
  const soonest = input.now.getTime() + daysAfter * 24 * 60 * 60 * 1000
  if (!input.lastDate) return new Date(soonest)
  const end = Temporal.PlainDate.from(input.lastDate).add({ days: daysAfter + 1 }).toZonedDateTime(input.zone ?? 'UTC')
  return new Date(Math.max(soonest, end.epochMilliseconds))
}
