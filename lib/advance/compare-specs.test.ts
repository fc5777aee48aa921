import { describe, expect, it } from 'vitest'
import { changeSentences, compareSpecs, specsAreSame } from './compare-specs'
import type { FrozenEntry } from './frozen-kit'
import type { RigSpec } from './revision-document'
import { sampleDrum, sampleSpec } from './sample-revision'

const kit = (change: (entry: FrozenEntry) => FrozenEntry | null): RigSpec => ({
  ...sampleSpec,
  kit: sampleSpec.kit.flatMap((entry) => change(entry) ?? []),
})
const tomWith = (spec: object) =>
  kit((entry) =>
    entry.id === 'k-tom' && entry.kind === 'drum' ? { ...entry, spec: { ...entry.spec, ...spec } } : entry,
  )
const sentences = (before: RigSpec, after: RigSpec) => changeSentences(compareSpecs(before, after))

describe('what changed between two states of a rig', () => {
  it('is nothing between a rig and itself', () => {
    expect(sentences(sampleSpec, sampleSpec)).toEqual([])
  })

  it('names lines that are new, dropped and different', () => {
    const without = kit((entry) => (entry.id === 'k-ride' ? null : entry))
    expect(sentences(without, sampleSpec)).toEqual(['New: Ride 21, 21 in (533 mm)'])
    expect(sentences(sampleSpec, without)).toEqual(['No longer wanted: Ride 21, 21 in (533 mm)'])
    expect(sentences(tomWith({ depthIn: 9, lugs: 5, insteadOf: null }), sampleSpec)).toEqual([
      'Tom 12: size 12 in across, 9 deep (305 × 229 mm) → 12 in across, 8 deep (305 × 203 mm); lugs 5 → 6; instead only by asking → 12 to 13 in across, 7 to 10 in deep',
    ])
  })

  it('names a line dropped when its entry is carried from now on', () => {
    const carried = kit((entry) => (entry.id === 'k-throne' ? { ...entry, supply: 'carried' } : entry))
    expect(sentences(sampleSpec, carried)).toEqual(['No longer wanted: Throne'])
  })

  it('says what changes for the tuner apart from what is asked', () => {
    const changes = compareSpecs(tomWith({ note: { semitone: 50, cents: -5 }, toleranceCents: 8 }), sampleSpec)
    expect(changes.changed).toEqual([])
    expect(changes.tuning).toEqual([
      { entryId: 'k-tom', name: 'Tom 12', differences: ['note D3 −5 cents → C♯3', 'tolerance 8 cents → 10 cents'] },
    ])
  })

  it('says what was learnt about a drum: its tap over its note, and how far a head goes', () => {
    const learnt = tomWith({
      measuredTapRatio: 1.72,
      batter: {
        ...sampleDrum({ id: '', name: '', position: 0 }, { role: 'tom', diameterIn: 12, depthIn: 8, lugs: 6 }).spec
          .batter,
        range: { slackNPerM: 650, chokedNPerM: 4200 },
      },
    })
    expect(compareSpecs(sampleSpec, learnt)).toMatchObject({
      changed: [],
      tuning: [
        { differences: ['measured tap over note not measured → 1.72', 'batter range as usual → 650 to 4200 N/m'] },
      ],
    })
  })

  it('tells a new reference pitch for every drum', () => {
    const at442 = { ...sampleSpec, party: { ...sampleSpec.party, referenceHz: 442 } }
    expect(compareSpecs(sampleSpec, at442).tuning.map(({ differences }) => differences)).toEqual(
      Array(5).fill(['A4 440 Hz → 442 Hz']),
    )
  })

  it('counts what moved on the plot and names what changed in the patch', () => {
    const { hats, ...rest } = sampleSpec.plot.document.pieces
    if (!hats) throw new Error('the sample plot has hats')
    const moved: RigSpec = {
      ...sampleSpec,
      plot: {
        sequence: 99,
        document: {
          ...sampleSpec.plot.document,
          pieces: { ...rest, kick: { ...hats, id: 'kick' }, extra: { ...hats, id: 'extra' } },
        },
      },
      channels: sampleSpec.channels
        .slice(1)
        .map((channel) => (channel.number === 2 ? { ...channel, name: 'Snare top' } : channel)),
    }
    expect(sentences(sampleSpec, moved)).toEqual([
      'Plot: 1 placed, 1 moved or changed, 1 taken off',
      'Patch: channel 1 Kick is gone',
      'Patch: channel 2 Snare → channel 2 Snare top',
    ])
  })
})

describe('two states of a rig', () => {
  it('are the same when the plot was touched and put back, or the kit comes in another order', () => {
    expect(
      specsAreSame(sampleSpec, {
        ...sampleSpec,
        plot: { ...sampleSpec.plot, sequence: 400 },
        kit: [...sampleSpec.kit].reverse(),
      }),
    ).toBe(true)
  })

  it('are the same when one was written before heads had a range and drums a measured ratio', () => {
    expect(specsAreSame(sampleSpec, tomWith({ measuredTapRatio: null }))).toBe(true)
    expect(specsAreSame(tomWith({ measuredTapRatio: 1.7 }), tomWith({ measuredTapRatio: null }))).toBe(false)
  })

  it('differ by a note, a channel, the paper', () => {
    expect(specsAreSame(sampleSpec, tomWith({ note: null }))).toBe(false)
    expect(specsAreSame(sampleSpec, { ...sampleSpec, channels: [] })).toBe(false)
    expect(specsAreSame(sampleSpec, { ...sampleSpec, party: { ...sampleSpec.party, paper: 'Letter' } })).toBe(false)
  })
})
