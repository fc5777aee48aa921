import { renderToStaticMarkup } from 'react-dom/server'
import { describe, expect, it } from 'vitest'
import type { KnownHead } from '@/lib/contracts/gauge'
import { calibrateGauge } from '@/lib/tuning/gauge-calibration'
import { sampleGauge, samplePair, tom12 } from '@/lib/tuning/sample-gauge'
import { CalibrationChart } from './calibration-chart'
import { chosenHead } from './head-choice'
import { OtherFilms } from './other-films'
import { pairCountWords } from './pair-count-words'

const text = (html: string) =>
  html
    .replace(/<[^>]+>/g, ' ')
    .replace(/\s+/g, ' ')
    .trim()
const count = (html: string, pattern: RegExp) => (html.match(pattern) ?? []).length
const places = (html: string, side: string) =>
  [...html.matchAll(new RegExp(`${side}:([\\d.]+)%`, 'g'))].map(([, share]) => Number(share))

const draw = (profile: typeof sampleGauge, head: Parameters<typeof CalibrationChart>[0]['head'] = null) =>
  renderToStaticMarkup(
    <CalibrationChart
      calibration={calibrateGauge(profile)}
      readings={profile.pairs.map(({ reading }) => reading)}
      head={head}
      asked={null}
    />,
  )

describe('a calibration, drawn', () => {
  it('holds every pair within the drawing and says in words what it shows', () => {
    const html = draw(sampleGauge)
    expect(html).toContain('aria-label="Brass gauge: 10 pairs, 950 to 4600 N/m, reading')
    expect(count(html, /data-part="pair"/g)).toBe(10)
    for (const side of ['left', 'bottom'])
      for (const share of places(html, side)) {
        expect(share).toBeGreaterThanOrEqual(0)
        expect(share).toBeLessThanOrEqual(100)
      }
    expect(text(html)).toContain('not calibrated')
    expect(text(html)).not.toContain('doubtful')
  })

  it('marks a pair that was set aside by another shape and a word', () => {
    const wrong = { ...samplePair(tom12, 2200), reading: 52 }
    const html = draw({ ...sampleGauge, pairs: [...sampleGauge.pairs, wrong] })
    expect(count(html, /data-part="pair"/g)).toBe(10)
    expect(count(html, /data-part="doubtful pair"/g)).toBe(1)
    expect(text(html)).toContain('doubtful pair, left out')
  })

  it('counts along its foot in film tension, or in the taps of a head', () => {
    expect(text(draw(sampleGauge))).toContain('1 1.5 2 3 4 5 Film tension, kN/m')
    const taps = text(draw(sampleGauge, { words: 'Tom 12', head: tom12 }))
    // 255.32 Hz at 2000 N/m (derived), so from 162 Hz at 805 to 420 at 5428: every fifty.
    expect(taps).toContain('200 250 300 350 400 Tap in Hz of Tom 12')
  })
})

describe('the same reading on other film', () => {
  it('says how much lower two plies sound than one, and does not name this head twice', () => {
    const words = text(
      renderToStaticMarkup(<OtherFilms calibration={calibrateGauge(sampleGauge)} head={tom12} reading={75} />),
    )
    expect(words).toMatch(/10 mil one-ply , this head/)
    expect(words).toMatch(/7 \+ 7 mil two-ply .* cents lower/)
    expect(count(words, /10 mil one-ply/g)).toBe(1)
    expect(words).not.toContain('higher')
  })
})

describe('the head asked about', () => {
  const known: KnownHead = {
    ...{
      words: 'Tom 12, batter',
      diameterIn: 12,
      depthIn: 8,
      plyMils: [10],
      film: 'coated',
      coatingGPerM2: 40,
      openShell: false,
    },
    tapHz: 256,
  }
  const typed = { known: '', diameterIn: '13', depthIn: '9', plyMils: '7 + 7' }

  it('is one of the kits’ with its tap, or any other as typed', () => {
    expect(chosenHead({ ...typed, known: known.words }, [known])).toMatchObject({
      ...{ words: 'Tom 12, batter', tapHz: 256, head: { coatingGPerM2: 40 } },
    })
    expect(chosenHead(typed, [known])).toEqual({
      words: 'a head of 13×9 in, 7 + 7 mil',
      head: { diameterIn: 13, depthIn: 9, plyMils: [7, 7], coatingGPerM2: 0 },
      tapHz: null,
    })
    expect(chosenHead({ ...typed, depthIn: '6,5' }, [])?.head.depthIn).toBe(6.5)
  })

  it.each([
    { ...typed, diameterIn: '' },
    { ...typed, diameterIn: '0.33' },
    { ...typed, diameterIn: '330' },
    { ...typed, depthIn: 'deep' },
    { ...typed, plyMils: '' },
    { ...typed, plyMils: '254' },
  ])('is none while what is typed cannot be: %j', (choice) => {
    expect(chosenHead(choice, [known])).toBeNull()
  })
})

describe('how far a gauge is', () => {
  it.each([
    [0, '0 of 3 pairs'],
    [2, '2 of 3 pairs'],
    [3, '3 pairs'],
  ])('%d pairs: %s', (pairs, words) => {
    expect(pairCountWords(pairs)).toBe(words)
  })
})
