/** A calendar date as it is read out: "Tue 14 Oct 2031". */
export function dateWords(date: string): string {
  const at = new Date(`${date}T00:00:00Z`)
  return part(at, { weekday: 'short', day: 'numeric', month: 'short', year: 'numeric' }, 'UTC').replaceAll(',', '')
}

/** A date and a wall time of a place, with the zone beside it: "Tue 14 Oct 2031, 20:30 (Europe/Paris)". */
export function whenWords(date: string, time: string | null, zone: string | null, dayOffset = 0): string {
  if (time === null) return dateWords(date)
  const later = dayOffset > 0 ? ` +${dayOffset} ${dayOffset === 1 ? 'day' : 'days'}` : ''
  return `${dateWords(date)}, ${time}${later} (${zone ?? 'time zone not known yet'})`
}

/** An instant as the wall clock of a place shows it; in UTC, and saying so, while the zone is not known. */
export function instantWords(instant: string, zone: string | null): string {
  const at = new Date(instant)
  const day = part(at, { weekday: 'short', day: 'numeric', month: 'short', year: 'numeric' }, zone ?? 'UTC').replaceAll(
    ',',
    '',
  )
  const time = part(at, { hour: '2-digit', minute: '2-digit', hourCycle: 'h23' }, zone ?? 'UTC')
  return `${day}, ${time} (${zone ?? 'UTC'})`
}

/** A window between two wall times of one date; either end may be open. */
export function windowWords(date: string, from: string | null, until: string | null, zone: string | null): string {
  const span = from && until ? `${from} to ${until}` : from ? `from ${from}` : until ? `until ${until}` : null
  return whenWords(date, span, zone)
}

function part(at: Date, format: Intl.DateTimeFormatOptions, timeZone: string): string {
  return new Intl.DateTimeFormat('en-GB', { ...format, timeZone }).format(at)
}
