import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { canonicalJson } from './canonical-json'
import type { FrozenDrum, FrozenEntry } from './frozen-kit'
import { insteadOfWords, lineContent, lineDetails, linesOfKit, lineWords } from './line-content'
import { sampleDrum, sampleKit } from './sample-revision'

const tom = sampleDrum(
  { id: 'tom', name: 'Rack tom', position: 3 },
  {
    ...{ role: 'tom', diameterIn: 12, depthIn: 8, lugs: 6 },
    insteadOf: { diameterMinIn: 12, diameterMaxIn: 13, depthMinIn: 7, depthMaxIn: 10 },
  },
)
const withSpec = (spec: Partial<FrozenDrum['spec']>): FrozenDrum => ({ ...tom, spec: { ...tom.spec, ...spec } })
const asked = (entry: FrozenEntry) => {
  const content = lineContent(entry)
  if (!content) throw new Error('not asked for')
  return content
}
const text = (entry: FrozenEntry) => canonicalJson(asked(entry))

describe('what a line asks', () => {
  it.each<[string, FrozenDrum]>([
    ['the note', withSpec({ note: { semitone: 50, cents: 0 } })],
    ['the lock on the note', withSpec({ noteLocked: true })],
    ['the relation of the heads', withSpec({ headRelationCents: 300 })],
    ['the measured tap ratio', withSpec({ measuredTapRatio: 1.7 })],
    ['the warble limit', withSpec({ warbleLimitHz: 0.5 })],
    ['the tolerance', withSpec({ toleranceCents: 4 })],
    ['the muffling', withSpec({ muffling: 'one gel' })],
    [
      'a gauge reading',
      withSpec({
        batter: { ...tom.spec.batter, gauge: 81 },
        resonant: { ...tom.spec.batter, film: 'clear', coatingGPerM2: 0, gauge: 1 },
      }),
    ],
    [
      'the playable range of a head',
      withSpec({ batter: { ...tom.spec.batter, range: { slackNPerM: 650, chokedNPerM: 4200 } } }),
    ],
    ['the place in the kit', { ...tom, position: 40 }],
  ])('stays the same when only %s changes, so nobody is asked again', (_, changed) => {
    expect(text(changed)).toBe(text(tom))
  })

  it.each<[string, FrozenDrum]>([
    ['the diameter', withSpec({ diameterIn: 13 })],
    ['the depth', withSpec({ depthIn: 9 })],
    ['the lugs', withSpec({ lugs: 8 })],
    ['the shell', withSpec({ shell: 'birch' })],
    ['the port', withSpec({ ported: true })],
    ['the plies of a head', withSpec({ batter: { ...tom.spec.batter, plyMils: [7, 7] } })],
    ['the coating of a head', withSpec({ batter: { ...tom.spec.batter, coatingGPerM2: 90 } })],
    ['the damping of a head', withSpec({ resonant: { ...tom.spec.batter, damping: 'ring' } })],
    ['the resonant head itself', withSpec({ resonant: null })],
    ['what may come instead', withSpec({ insteadOf: null })],
    ['who brings it', { ...tom, supply: 'venue' }],
    ['the count', { ...tom, count: 2 }],
    ['the remark', { ...tom, remark: 'with feet' }],
  ])('changes with %s', (_, changed) => {
    expect(text(changed)).not.toBe(text(tom))
  })

  it('is read out in the trade’s words, for both units', () => {
    expect(lineWords(asked(tom), 'imperial')).toBe('Rack tom, 12 in across, 8 deep, 6 lugs')
    expect(lineWords(asked(tom), 'metric')).toBe('Rack tom, 12 in across, 8 deep (305 × 203 mm), 6 lugs')
    expect(insteadOfWords(asked(tom))).toBe('12 to 13 in across, 7 to 10 in deep')
    expect(insteadOfWords(asked(withSpec({ insteadOf: null })))).toBeNull()
    expect(
      lineDetails(
        asked(
          withSpec({ batter: { ...tom.spec.batter, plyMils: [7, 7], film: 'clear', damping: 'dot' }, resonant: null }),
        ),
      ),
    ).toEqual(['tom, maple', 'new heads: 7 + 7 mil two-ply clear with a centre dot batter, no resonant head'])
  })

  it('counts, and does not say twice what the name says', () => {
    const words = sampleKit.flatMap((entry) => {
      const content = lineContent(entry)
      return content ? [lineWords(content, 'imperial')] : []
    })
    expect(words).toEqual([
      'Kick 22, 22 in across, 16 deep, 8 lugs',
      'Tom 12, 12 in across, 8 deep, 6 lugs',
      'Tom 14, 14 in across, 10 deep, 8 lugs',
      'Floor tom 16, 16 in across, 14 deep, 8 lugs',
      'Ride 21, 21 in',
      'Throne',
      '4 × Boom stands',
      '8 × Drum microphones, dynamic microphone, short stand',
    ])
  })
})

describe('the lines of a kit', () => {
  it('leave out what is carried and are numbered in the kit’s order', () => {
    const shuffled = [...sampleKit].reverse()
    const lines = linesOfKit(shuffled)
    expect(lines.map((line) => line.entryId)).toEqual([
      'k-kick',
      'k-tom',
      'k-low',
      'k-floor',
      'k-ride',
      'k-throne',
      'k-boom',
      'k-mic',
    ])
    expect(lines.map((line) => line.position)).toEqual([1, 2, 3, 4, 5, 6, 7, 8])
  })
})

describe('canonical JSON', () => {
  it('is the same text whatever the order of the keys', () => {
    const scrambled = (value: unknown): unknown =>
      Array.isArray(value)
        ? value.map(scrambled)
        : typeof value === 'object' && value !== null
          ? Object.fromEntries(
              Object.entries(value)
                .reverse()
                .map(([key, inner]) => [key, scrambled(inner)]),
            )
          : value
    fc.assert(
      fc.property(fc.jsonValue(), (value) => {
        expect(canonicalJson(scrambled(value))).toBe(canonicalJson(value))
        // −0 is the one value that JSON itself does not keep.
        expect(JSON.parse(canonicalJson(value))).toEqual(JSON.parse(JSON.stringify(value)))
      }),
    )
  })

  it('leaves out what is undefined and refuses what JSON cannot hold', () => {
    expect(canonicalJson({ b: 1, a: undefined, c: [undefined, 'é'] })).toBe('{"b":1,"c":[null,"é"]}')
    expect(() => canonicalJson({ a: Number.NaN })).toThrow(TypeError)
  })
})
