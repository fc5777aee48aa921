import type { Bench, BenchHead } from '@/lib/contracts/bench'

/** Hz as they are read off: one decimal, as near as a tap can be heard. */
export function hzWords(hz: number): string {
  return hz.toFixed(1)
}

/** A value of a reading in its own unit: "251.5 Hz", "-12 cents", "75 on the gauge". */
export function readingWords({ value, unit }: { value: number; unit: 'Hz' | 'cents' | 'gauge' }): string {
  const figure = String(Math.round(value * 10) / 10)
  if (unit === 'gauge') return `${figure} on the gauge`
  return unit === 'Hz' ? `${figure} Hz` : `${value > 0 ? '+' : ''}${figure} cents`
}

/** A gauge's starting reading in a line: "72 (70–74)", "75, as noted". */
export function gaugeWords(gauge: NonNullable<BenchHead['gauge']>): string {
  if (gauge.kind === 'noted') return `${gauge.reading}, as noted`
  return gauge.bounds === null ? gauge.reading : `${gauge.reading} (${gauge.bounds})`
}

/** Where the sheet comes from: "Revision 7 of full rig, sent to this show". */
export function sheetWords({ rig, sheet }: Pick<Bench, 'rig' | 'sheet'>): string {
  if (!sheet) return `No revision of ${rig} yet`
  const from = sheet.from === 'sent' ? 'sent to this show' : 'not yet sent to this show'
  const newer =
    sheet.newestNumber > sheet.number ? `; revision ${sheet.newestNumber} was issued since and not sent here` : ''
  return `Revision ${sheet.number} of ${rig}, ${from}${newer}`
}

/** A time of day by the venue's clock, with its zone; in UTC while the zone is not known. */
export function clockWords(instant: string, zone: string | null): string {
  const time = new Intl.DateTimeFormat('en-GB', {
    hour: '2-digit',
    minute: '2-digit',
    hourCycle: 'h23',
    timeZone: zone ?? 'UTC',
  })
  return `${time.format(new Date(instant))} (${zone ?? 'UTC'})`
}

const cautions: Record<BenchHead['cautions'][number], string> = {
  slack: 'At this note the film is near its slack edge: it may rattle or go dead before every lug is even.',
  choked: 'At this note the head is near choking: bring it up in small steps and stop if it pings or creaks.',
  'film-stress':
    'At this note the film carries a great part of what it can: keep faces clear, and stop and ask if a rod gets stiff.',
}

export function headCautionWords(head: BenchHead): string[] {
  return head.cautions.map((caution) => cautions[caution])
}

export const lugOneWords = {
  batter: 'Lug 1 is the first lug clockwise from the badge, seen facing this head.',
  resonant:
    'Turn the drum over. Lug 1 is the first lug clockwise from the badge, seen facing this head: the batter head mirrored.',
} as const
