import { Temporal } from 'temporal-polyfill'

/** What the wall shows at a place: a calendar date, YYYY-MM-DD, and a time of day, HH:MM. */
export type WallTime = { date: string; time: string }

/**
 * The instant at which a wall in the zone shows this. Where clocks go forward and the time does not exist, it is moved on
 * by the gap; where they go back and it exists twice, it is the first (the rule "compatible" of RFC 5545 calendars).
 * Throws RangeError on an unknown zone or an impossible date.
 */
export function instantOfWallTime({ date, time }: WallTime, zone: string): Date {
  const local = Temporal.PlainDateTime.from(`${date}T${time}`)
  return new Date(local.toZonedDateTime(zone, { disambiguation: 'compatible' }).epochMilliseconds)
}

/** What a wall in the zone shows at an instant, seconds dropped. */
export function wallTimeOfInstant(instant: Date, zone: string): WallTime {
  const there = Temporal.Instant.fromEpochMilliseconds(instant.getTime()).toZonedDateTimeISO(zone)
  return { date: there.toPlainDate().toString(), time: there.toPlainTime().toString({ smallestUnit: 'minute' }) }
}
