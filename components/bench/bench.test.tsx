import { renderToStaticMarkup } from 'react-dom/server'
import { describe, expect, it } from 'vitest'
import type { Bench, BenchDrum, BenchHead, BenchReading } from '@/lib/contracts/bench'
import { BenchApp } from './bench-app'
import { BenchBoard } from './bench-board'
import { hzWords, readingWords, sheetWords } from './bench-words'
import { HeadPage } from './head-page'

const head = (side: BenchHead['side'], more: Partial<BenchHead> = {}): BenchHead => ({
  ...{
    side,
    words: '10 mil one-ply coated',
    note: { hz: 146.832, name: 'D3', cents: 0 },
    rodPullN: 300,
    gauge: { kind: 'noted', reading: '75' },
  },
  ...{ tap: { hz: 256, name: 'C4', lowHz: 246, highHz: 262 }, cautions: [], without: null },
  ...more,
})
const tom: BenchDrum = {
  ...{
    entryId: 'tom',
    name: 'Tom 12',
    role: 'tom',
    sizeWords: '12 in across, 8 deep',
    lugCount: 6,
    toleranceCents: 10,
    warbleLimitHz: 1,
  },
  lugAnglesRad: [1, 3, 5, 7, 9, 11].map((share) => (share * Math.PI) / 6),
  ...{ muffling: '', relationWords: 'both heads at one pitch', instead: null, missing: false },
  heads: [head('batter'), head('resonant')],
}
const reading = (lug: number, value: number, more: Partial<BenchReading> = {}): BenchReading => ({
  ...{
    id: `r${lug}-${value}`,
    entryId: 'tom',
    side: 'batter',
    lug,
    value,
    unit: 'Hz',
    method: 'tap-typed',
    targetHz: 256,
  },
  ...{ otherHead: 'damped', onStand: false, gauge: '', temperatureC: null, pass: 1, strikes: null },
  ...{ deviceId: 'abcd', deviceSequence: lug, deviceAt: '2031-10-14T16:05:00Z', serverAt: '2031-10-14T16:05:01Z' },
  ...{ byName: 'Local hand', via: 'link' },
  ...more,
})
const bench = (more: Partial<Bench> = {}): Bench => ({
  show: { id: 's', title: 'Salle Nord', town: 'Arvic', date: '2031-10-14', zone: 'Europe/Paris', mustNotRetune: null },
  ...{ party: 'A party', rig: 'full rig', sheet: { number: 7, from: 'sent', newestNumber: 7 }, drums: [tom] },
  ...{ readings: [], signOffs: [] },
  ...more,
})
const session = {
  subscribe: () => () => undefined,
  state: () => ({ bench: bench(), waiting: 0, refused: [], connection: 'sent' as const, problem: null, kept: true }),
  log: () => reading(1, 256),
  ...{
    sign: () => undefined,
    letGo: () => undefined,
    retryNow: () => undefined,
    start: () => undefined,
    stop: () => undefined,
  },
}
const words = (markup: string) =>
  markup
    .replace(/<[^>]*>/g, ' ')
    .replace(/&#x27;/g, "'")
    .replace(/\s+/g, ' ')
const page = (at: Bench, drum = tom, side: BenchHead['side'] = 'batter') => {
  const open = drum.heads.find((one) => one.side === side) ?? head(side)
  return renderToStaticMarkup(
    <HeadPage bench={at} drum={drum} head={open} session={session} name="" keepName={() => undefined} />,
  )
}
/** 12 cents under 256 Hz is 254.2317 Hz; 20 cents over is 258.9746 Hz. */
const uneven = [254.2317, 256, 256, 256, 258.9746, 256].map((value, i) => reading(i + 1, value))

describe('the list of drums', () => {
  const list = (at: Bench) =>
    words(
      renderToStaticMarkup(<BenchApp initial={at} place={{ kind: 'link', token: 't' }} owner="link" ownName={null} />),
    )

  it('says which revision it is of, how far each head is and who signed off', () => {
    const signOff = {
      id: 'x',
      entryId: 'tom',
      decision: 'signed' as const,
      byName: 'Local hand',
      remark: '',
      at: '2031-10-14T16:10:00Z',
    }
    const text = list(bench({ readings: uneven.slice(0, 4), signOffs: [signOff] }))
    expect(text).toContain('Revision 7 of full rig, sent to this show.')
    expect(text).toContain('4 of 6 read')
    expect(text).toContain('Signed off by Local hand, 18:10 (Europe/Paris)')
    expect(text).toContain('All drums signed off')
  })

  it('says what is missing when there is no sheet, and warns of a kit that must stay as it is', () => {
    expect(list(bench({ sheet: null, drums: [] }))).toContain('No tuning sheet yet')
    const shared = bench()
    expect(list({ ...shared, show: { ...shared.show, mustNotRetune: 'the festival' } })).toContain(
      'belongs to the festival',
    )
    expect(list(bench({ drums: [{ ...tom, missing: true }] }))).toContain('this drum does not come')
  })
})

describe('a head', () => {
  it('leads with the tap pitch and its bounds, the words of the protocol, and the first lug of the order', () => {
    const text = words(page(bench()))
    expect(text).toContain('256.0 Hz')
    expect(text).toContain('246.0 to 262.0 Hz')
    expect(text).toContain('Drum off its stand, the other head damped, a fingertip on the centre')
    expect(text).toContain('Keep lug 1, go to lug 4')
    expect(text).toContain('Lug 1 is the first lug clockwise from the badge, seen facing this head.')
    expect(text).toContain('A head under tension or a rod can let go')
  })

  it('mirrors the resonant head, lug 1 on the other side of the badge', () => {
    const claw = (markup: string) => /data-lug="1".*?rotate\((\d+)\)/.exec(markup)?.[1]
    expect(claw(page(bench()))).toBe('30')
    const lopsided = { ...tom, lugAnglesRad: [0.2, 1.2, 2.2, 3.2, 4.2, 5.2] }
    // Facing the resonant head the last lug of the shell, 5.2 rad round, comes first: 2π − 5.2 rad is 62°.
    expect(/data-lug="1".*?rotate\(([\d.]+)\)/.exec(page(bench(), lopsided, 'resonant'))?.[1]).toBe('62.062')
    expect(/data-lug="1".*?rotate\(([\d.]+)\)/.exec(page(bench(), lopsided))?.[1]).toBe('11.459')
  })

  it('says which lugs are out and gives no next move', () => {
    const text = words(page(bench({ readings: uneven })))
    expect(text).toContain('Lug 1 is low by 12 cents; lug 5 is high by 20 cents')
    expect(text).toContain('within 10 cents')
    expect(text).not.toMatch(/tighten|ease (lug|\d)|turn lug/i)
  })

  it('says that an even head is even, and that a gauge is relative', () => {
    const even = [1, 2, 3, 4, 5, 6].map((lug) => reading(lug, 256))
    expect(words(page(bench({ readings: even })))).toContain('Every lug is even')
    const gauge = even.map((one) => ({
      ...one,
      method: 'gauge' as const,
      unit: 'gauge' as const,
      value: 76,
      targetHz: null,
    }))
    const text = words(page(bench({ readings: gauge })))
    expect(text).toContain('Gauge readings are relative to that gauge')
    expect(text).toContain('The drum tech’s own gauge read 75 on the gauge')
  })

  it('reads a snare side without calling anything out', () => {
    const snare: BenchDrum = { ...tom, role: 'snare' }
    const text = words(
      page(bench({ drums: [snare], readings: uneven.map((one) => ({ ...one, side: 'resonant' })) }), snare, 'resonant'),
    )
    expect(text).toContain('Snare beds make this side uneven on purpose')
    expect(text).not.toMatch(/\b(low|high) by\b/)
  })

  it('warns beside the figure, and says why there is none', () => {
    expect(
      words(page(bench(), { ...tom, heads: [head('batter', { cautions: ['choked', 'film-stress'] })] })),
    ).toContain('near choking')
    const bare = {
      ...tom,
      heads: [head('batter', { note: null, tap: null, without: 'No note is set for this drum.' })],
    }
    expect(words(page(bench(), bare))).toContain('No note is set for this drum.')
  })
})

describe('the drum tech’s board', () => {
  it('shows each head’s mean, spread and log, with the struck reading still there', () => {
    const mended = reading(1, 256, { id: 'mended', strikes: uneven[0]?.id ?? null, deviceSequence: 7 })
    const text = words(renderToStaticMarkup(<BenchBoard bench={bench({ readings: [...uneven, mended] })} />))
    expect(text).toContain('Lug 5 is high by 20 cents')
    expect(text).not.toContain('Lug 1 is low')
    expect(text).toContain('254.2 Hz corrected')
    expect(text).toContain('7 readings')
    expect(text).toContain('18:05 (Europe/Paris)')
  })
})

describe('words', () => {
  it('write figures with their units', () => {
    expect([
      hzWords(254.2317),
      readingWords({ value: -12, unit: 'cents' }),
      readingWords({ value: 8, unit: 'cents' }),
    ]).toEqual(['254.2', '-12 cents', '+8 cents'])
    expect(readingWords({ value: 75.5, unit: 'gauge' })).toBe('75.5 on the gauge')
  })

  it('say when a newer revision was issued and not sent', () => {
    expect(sheetWords({ rig: 'full rig', sheet: { number: 7, from: 'sent', newestNumber: 8 } })).toContain(
      'revision 8 was issued since and not sent here',
    )
    expect(sheetWords({ rig: 'full rig', sheet: null })).toBe('No revision of full rig yet')
  })
})
