const dayMs = 86_400_000

/** The calendar date `days` after a date, both YYYY-MM-DD. A date has no zone here, so no day is 23 or 25 hours long. */
export function dateAfter(date: string, days: number): string {
  return new Date(Date.parse(`${date}T00:00:00Z`) + days * dayMs).toISOString().slice(0, 10)
}

/** How many days from one date to another; negative when the other is earlier. */
export function daysBetween(from: string, to: string): number {
  return Math.round((Date.parse(`${to}T00:00:00Z`) - Date.parse(`${from}T00:00:00Z`)) / dayMs)
}

/** Every date of a span, both ends included; none when the last is before the first. */
export function datesOf(first: string, last: string): string[] {
  return Array.from({ length: Math.max(0, daysBetween(first, last) + 1) }, (_, index) => dateAfter(first, index))
}

const dayFormat = new Intl.DateTimeFormat('en-GB', {
  weekday: 'short',
  day: 'numeric',
  month: 'short',
  timeZone: 'UTC',
})

/** A date in words, "Thu 15 Oct". */
export function dateWords(date: string): string {
  return dayFormat.format(new Date(`${date}T00:00:00Z`)).replace(',', '')
}
