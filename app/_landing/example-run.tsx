import { RunStrip } from '@/components/signature/run-strip'
import type { RunStripDay, RunStripHire } from '@/components/signature/run-strip'
import type { ShowBarCounts } from '@/components/signature/show-bar'

const shows: Record<string, [venue: string, town: string, bar: ShowBarCounts | null]> = {
  '2026-10-12': ['Harbour Hall', 'Lisby', { settled: 14, waiting: 0, changed: 0 }],
  '2026-10-14': ['Kornhaus', 'Welden', { settled: 11, waiting: 3, changed: 0 }],
  '2026-10-15': ['Salle Nord', 'Arvic', { settled: 8, waiting: 3, changed: 3 }],
  '2026-10-17': ['The Tannery', 'Millford', { settled: 4, waiting: 10, changed: 0 }],
  '2026-10-18': ['Opera Annex', 'Brennau', { settled: 2, waiting: 12, changed: 0 }],
  '2026-10-20': ['Dock 9', 'Havnes', null],
  '2026-10-21': ['Union Rooms', 'Castleby', null],
  '2026-10-23': ['Palais Est', 'Montrive', null],
  '2026-10-25': ['Lakeside', 'Orrin', null],
}

const days: RunStripDay[] = Array.from({ length: 14 }, (_, index) => {
  const date = `2026-10-${12 + index}`
  const show = shows[date]
  return {
    id: date,
    date,
    shows: show
      ? [{ id: date, href: '/', venue: show[0], town: show[1], bar: show[2], chosen: date === '2026-10-15' }]
      : [],
  }
})

const hires: RunStripHire[] = [
  {
    id: 'northline',
    label: 'Northline hire, one van, deliver 12 Oct 09:00',
    firstDate: '2026-10-12',
    lastDate: '2026-10-18',
    state: 'settled',
  },
  {
    id: 'fjord',
    label: 'Fjord Backline hire, quote open',
    firstDate: '2026-10-20',
    lastDate: '2026-10-25',
    state: 'waiting',
  },
]

/** An invented tour on the run strip: a picture here, so that nothing in it can be pressed. */
export function ExampleRun() {
  return (
    <div
      role="img"
      aria-label="An example run of fourteen days: nine shows with days off between them and two hires beneath, each show with a bar of what is settled, waiting and changed."
    >
      <div inert>
        <RunStrip
          label="Example run"
          tour={{ href: '/', chosen: false, note: '3 things next' }}
          days={days}
          hires={hires}
        />
      </div>
    </div>
  )
}
