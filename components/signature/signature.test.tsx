import { renderToStaticMarkup } from 'react-dom/server'
import { describe, expect, it } from 'vitest'
import { traceOutline } from '@/lib/tuning/trace'
import { Hoop } from './hoop'
import { layTape } from './lay-tape'
import { RangeBar } from './range-bar'
import { RunStrip } from './run-strip'
import { StandingBadge } from './standing-badge'
import { StateLine } from './state-line'
import { Trace } from './trace'
import type { TraceLug } from './trace-lug'

const count = (html: string, pattern: RegExp) => (html.match(pattern) ?? []).length
/** The attribute of each element that carries `data-part="…"` or `data-lug="…"`, as numbers. */
const element = (html: string, mark: string) => new RegExp(`<[a-z]+[^>]*${mark}[^>]*>`).exec(html)?.[0] ?? ''
const text = (html: string) =>
  html
    .replace(/<[^>]+>/g, ' ')
    .replace(/\s+/g, ' ')
    .trim()

describe('hoop', () => {
  it.each([4, 5, 6, 8, 10, 12])('draws one tick for each of %i lugs', (lugs) => {
    const html = renderToStaticMarkup(
      <Hoop role="tom" diameterIn={12} depthIn={8} lugs={lugs} name="Tom 12" note="D3" view="above" pxPerInch={8} />,
    )
    expect(count(html, /data-part="lug"/g)).toBe(lugs)
    expect(text(html)).toBe('Tom 12 D3')
  })

  it('is to scale: a 16 is twice an 8, and an inch is as many pixels as asked', () => {
    const radius = (diameterIn: number) => {
      const html = renderToStaticMarkup(
        <Hoop role="tom" diameterIn={diameterIn} depthIn={8} lugs={6} name="T" view="above" pxPerInch={10} />,
      )
      const widthMm = Number(/viewBox="\S+ \S+ (\S+)/.exec(html)?.[1])
      const pixels = Number(/ width="([\d.]+)"/.exec(html)?.[1])
      expect(pixels / (widthMm / 25.4)).toBeCloseTo(10, 3)
      return Number(/ r="([\d.]+)"/.exec(element(html, 'data-part="shell"'))?.[1])
    }
    expect(radius(8)).toBeCloseTo(101.6, 6)
    expect(radius(16)).toBeCloseTo(203.2, 6)
  })

  it('draws a kick from above as its rectangle and facing as its circle, with all its lugs', () => {
    const drum = { role: 'kick', diameterIn: 22, depthIn: 16, lugs: 8, name: 'Kick 22', pxPerInch: 6 } as const
    const above = renderToStaticMarkup(<Hoop {...drum} view="above" />)
    expect(element(above, 'data-part="shell"')).toMatch(/^<polygon/)
    expect(above).not.toContain('<circle')
    const facing = renderToStaticMarkup(<Hoop {...drum} view="facing" />)
    expect(element(facing, 'data-part="shell"')).toContain('r="279.4"')
    expect(count(facing, /data-part="lug"/g)).toBe(8)
  })

  it('says sizes, lugs and note to a screen reader', () => {
    const html = renderToStaticMarkup(
      <Hoop role="tom" diameterIn={12} depthIn={8} lugs={6} name="Tom 12" note="C♯3" view="above" pxPerInch={8} />,
    )
    expect(html).toContain('aria-label="Tom 12, 12 in across, 8 deep, 6 lugs, note C♯3"')
  })
})

describe('trace', () => {
  const lugs: TraceLug[] = [0.2, 0, -0.3, 0, null, 0].map((offset, index) => ({
    number: index + 1,
    angleRad: (index * Math.PI) / 3,
    offset,
    out: offset !== null && Math.abs(offset) > 0.1,
  }))
  const shared = { label: 'Tom 12, batter', bandInner: 0.9, bandOuter: 1.1, centre: 'Ease 1' }

  it('marks each lug that is out with its word, and no other', () => {
    const html = renderToStaticMarkup(<Trace {...shared} lugs={lugs} outline={null} />)
    expect(count(html, /data-out=/g)).toBe(2)
    expect(text(html)).toBe('1 high 2 3 low 4 5 6 Ease 1')
  })

  it('draws nothing between lugs that were not read, and closes only a whole round', () => {
    const draw = (deviations: (number | null)[]) => {
      const outline = traceOutline(
        deviations.map((deviation, index) => ({ lug: index + 1, seenRad: (index * Math.PI) / 2, deviation })),
        { radiusPerUnit: 0.01 },
      )
      return renderToStaticMarkup(<Trace {...shared} lugs={lugs} outline={outline} />)
    }
    const whole = draw([10, 0, -5, 0])
    expect(count(whole, /<polygon[^>]*data-part="curve"/g)).toBe(1)
    expect(count(whole, /data-part="reading"/g)).toBe(4)
    const gap = draw([10, 0, null, 0])
    expect(count(gap, /<polygon/g)).toBe(0)
    expect(count(gap, /<polyline[^>]*data-part="curve"/g)).toBe(1)
    expect(count(gap, /data-part="reading"/g)).toBe(3)
    expect(renderToStaticMarkup(<Trace {...shared} lugs={lugs} outline={null} />)).not.toContain('data-part="curve"')
  })

  it('draws the order in steps only while nothing was read', () => {
    const order = [1, 4, 2, 5, 3, 6]
    const before = renderToStaticMarkup(<Trace {...shared} lugs={lugs} outline={null} order={order} />)
    expect(before).toContain('data-part="order"')
    expect(text(before)).toContain('1st 2nd 3rd 4th 5th 6th')
    const after = renderToStaticMarkup(
      <Trace {...shared} lugs={lugs} outline={{ segments: [], closed: false, lugs: [{ x: 1, y: 0 }] }} order={order} />,
    )
    expect(after).not.toContain('data-part="order"')
  })
})

describe('run strip', () => {
  const html = renderToStaticMarkup(
    <RunStrip
      label="Autumn run"
      tour={{ href: '/', chosen: false, note: '3 things next' }}
      days={[
        {
          id: 'a',
          date: '2026-10-12',
          shows: [
            {
              id: 's',
              href: '/',
              venue: 'Harbour Hall',
              town: 'Lisby',
              bar: { settled: 6, waiting: 3, changed: 1 },
              chosen: true,
            },
          ],
        },
        { id: 'b', date: '2026-10-13', shows: [] },
        { id: 'c', date: '2026-10-14', shows: [], remark: 'travel' },
      ]}
      hires={[{ id: 'h', label: 'Northline hire', firstDate: '2026-10-12', lastDate: '2026-10-13', state: 'settled' }]}
    />,
  )

  it('begins with the tour, keeps every day, and says how the lines stand', () => {
    expect(text(html)).toBe(
      'Tour 3 things next Mon 12 Oct Harbour Hall Lisby 6 settled, 3 waiting, 1 changed Tue 13 Wed 14 travel Northline hire',
    )
  })

  it('names the chosen show, and only it, as current', () => {
    expect(count(html, /aria-current="page"/g)).toBe(1)
    expect(html).toMatch(/aria-current="page"[^>]*>\s*<span[^>]*>Mon 12 Oct/)
  })

  it('gives each state its share of the bar', () => {
    expect(element(html, 'data-part="settled"')).toContain('width:60%')
    expect(element(html, 'data-part="waiting"')).toContain('width:30%')
    expect(element(html, 'data-part="changed"')).toContain('width:10%')
  })
})

describe('tape', () => {
  const days = ['2026-10-12', '2026-10-13', '2026-10-14', '2026-10-15']
  const hire = (firstDate: string, lastDate: string) => ({ firstDate, lastDate })

  it('shares a lane between hires that do not meet and opens another for those that do', () => {
    const laid = layTape(
      [hire('2026-10-14', '2026-10-15'), hire('2026-10-12', '2026-10-13'), hire('2026-10-13', '2026-10-14')],
      days,
    )
    expect(laid.map(({ lane, fromColumn, toColumn }) => [lane, fromColumn, toColumn])).toEqual([
      [0, 0, 1],
      [1, 1, 2],
      [0, 2, 3],
    ])
  })

  it('says which end runs on, and leaves out a hire of other days', () => {
    const laid = layTape([hire('2026-10-01', '2026-10-12'), hire('2026-11-01', '2026-11-02')], days)
    expect(laid).toHaveLength(1)
    expect(laid[0]).toMatchObject({ startsBefore: true, endsAfter: false, fromColumn: 0, toColumn: 0 })
  })
})

describe('range bar', () => {
  const bar = (at: number) =>
    renderToStaticMarkup(
      <RangeBar
        scale={{ from: 40, to: 60 }}
        low={45}
        high={55}
        middleLow={48}
        middleHigh={52}
        note={{ at, name: 'D3' }}
        label="Tom 12: D3"
      />,
    )

  it('places range, middle and note on the scale', () => {
    const html = bar(50)
    expect(element(html, 'data-part="range"')).toContain('left:25%;width:50%')
    expect(element(html, 'data-part="middle"')).toContain('left:40%;width:20%')
    expect(element(html, 'data-part="note"')).toContain('left:50%')
  })

  it('gives a note outside the range another shape', () => {
    expect(element(bar(50), 'data-part="note"')).toContain('rounded-full')
    expect(element(bar(56), 'data-part="note"')).not.toContain('rounded-full')
  })
})

describe('states', () => {
  it('always say their word, each with an edge of its own', () => {
    const states = ['settled', 'waiting', 'changed', 'act', 'none'] as const
    const drawn = states.map((state) => renderToStaticMarkup(<StateLine state={state} title="Kick 22" />))
    expect(new Set(drawn.map((html) => text(html))).size).toBe(states.length)
    expect(new Set(drawn.map((html) => /border-(solid|dashed|double|dotted)/.exec(html)?.[0])).size).toBe(4)
  })

  it('standings say their word beside a shape of their own', () => {
    const standings = [
      'not sent',
      'out',
      'not delivered',
      'overdue',
      'part answered',
      'answered',
      'settled',
      'changed since',
    ] as const
    const drawn = standings.map((standing) => renderToStaticMarkup(<StandingBadge standing={standing} />))
    expect(drawn.map(text)).toEqual([...standings])
    expect(new Set(drawn.map((html) => /<svg.*<\/svg>/.exec(html)?.[0])).size).toBe(standings.length)
  })
})
