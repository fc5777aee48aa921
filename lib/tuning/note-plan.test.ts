import { describe, expect, it } from 'vitest'
import { planNotes } from './note-plan'
import type { NotePlanInput, PlanDrum } from './note-plan'
import { NOTE_TEMPLATES } from './note-template'
import type { NoteTemplate } from './note-template'

function template(id: string): NoteTemplate {
  const found = NOTE_TEMPLATES.find((each) => each.id === id)
  if (found === undefined) throw new Error(`no template ${id}`)
  return found
}

const batter = { plyMils: [10], coatingKgPerM2: 0 }
const KIT: PlanDrum[] = [
  { id: 'kick', role: 'kick', diameterIn: 22, batter },
  { id: 'snare', role: 'snare', diameterIn: 14, batter },
  { id: 'tom10', role: 'tom', diameterIn: 10, batter },
  { id: 'tom12', role: 'tom', diameterIn: 12, batter },
  { id: 'floor16', role: 'floor-tom', diameterIn: 16, batter },
]
const D3 = { semitone: 50, cents: 0 }

function plan(change: Partial<NotePlanInput> = {}) {
  const planned = planNotes({
    template: template('fourths'),
    drums: KIT,
    anchor: { drumId: 'tom12', note: D3 },
    ...change,
  })
  return Object.fromEntries(planned.map((drum) => [drum.drumId, drum]))
}

describe('note plan', () => {
  it('fourths from D3 on the 12: G3 on the 10, E2 on the 16 (common practice)', () => {
    const { tom10, tom12, floor16 } = plan()
    expect([tom10?.note, tom12?.note, floor16?.note]).toEqual([
      { semitone: 55, cents: 0 },
      D3,
      { semitone: 40, cents: 0 },
    ])
    expect(floor16?.noteHz).toBeCloseTo(82.4069, 4)
    expect([tom10?.origin, tom12?.origin]).toEqual(['template', 'anchor'])
  })

  it('keeps the order of the kit', () => {
    const planned = planNotes({ template: template('fourths'), drums: KIT })
    expect(planned.map(({ drumId }) => drumId)).toEqual(['kick', 'snare', 'tom10', 'tom12', 'floor16'])
  })

  it('a lock stands, and the others are stepped from the anchor as before', () => {
    const drums = KIT.map((drum) =>
      drum.id === 'floor16' ? { ...drum, lockedNote: { semitone: 43, cents: 10 } } : drum,
    )
    const { floor16, tom10 } = plan({ drums })
    expect(floor16).toMatchObject({ note: { semitone: 43, cents: 10 }, origin: 'locked' })
    expect(tom10?.note.semitone).toBe(55)
  })

  it('without an anchor a locked tom is the anchor', () => {
    const drums = KIT.map((drum) => (drum.id === 'tom10' ? { ...drum, lockedNote: { semitone: 56, cents: 0 } } : drum))
    expect(plan({ drums, anchor: undefined })['tom12']?.note.semitone).toBe(51)
  })

  it('without anchor or lock the middle tom takes the middle of its range', () => {
    const { tom12 } = plan({ anchor: undefined })
    expect(tom12?.origin).toBe('middle')
    expect(Math.abs((tom12?.rangePosition.fraction ?? 0) - 0.5)).toBeLessThan(0.05)
  })

  it('the kick lies a fourth, fifth or octave under the lowest tom', () => {
    const { kick, floor16 } = plan()
    expect([5, 7, 12]).toContain((floor16?.note.semitone ?? 0) - (kick?.note.semitone ?? 0))
    expect(kick?.warnings.map(({ kind }) => kind)).not.toContain('below-range')
  })

  it('the snare shares no note name with any tom, and stays near the middle of its range', () => {
    const { snare, tom10, tom12, floor16 } = plan()
    const tomNames = [tom10, tom12, floor16].map((drum) => (drum?.note.semitone ?? 0) % 12)
    expect(tomNames).not.toContain((snare?.note.semitone ?? 0) % 12)
    expect(snare?.rangePosition.zone).toBe('middle')
  })

  it('follows the party reference: the same notes, other Hz', () => {
    const { tom12 } = plan({ referenceHz: 442 })
    expect(tom12?.note).toEqual(D3)
    expect(tom12?.noteHz).toBeCloseTo((146.8324 * 442) / 440, 3)
  })

  it('the resonant head follows the template’s relation', () => {
    const higher = { ...template('fourths'), resonantCents: 1200 }
    expect(plan({ template: higher })['tom12']?.resonantHz).toBeCloseTo(2 * 146.8324, 3)
  })

  it('equal feel: every tom at the anchor’s film tension, within what a whole cent is worth', () => {
    const { tom10, tom12, floor16 } = plan({ template: template('equal-feel') })
    // A cent is 0.116 % of tension, and rounding leaves half of one.
    for (const drum of [tom10, floor16]) {
      expect(Math.abs((drum?.tensionNPerM ?? 0) / (tom12?.tensionNPerM ?? 1) - 1)).toBeLessThan(0.0006)
    }
    // 3.8 semitones from 10 to 12 in (derived; 10 mil).
    const semitones = 12 * Math.log2((tom10?.noteHz ?? 0) / (tom12?.noteHz ?? 1))
    expect(Math.abs(semitones - 3.8)).toBeLessThan(0.05)
  })

  it('strict fourths leave the big floor tom slacker than the small toms (derived), and the plan says when a note leaves the middle', () => {
    const drums: PlanDrum[] = [...KIT, { id: 'floor18', role: 'floor-tom', diameterIn: 18, batter }]
    const { floor18, tom10 } = plan({ drums })
    expect(floor18?.tensionNPerM).toBeLessThan(tom10?.tensionNPerM ?? 0)
    expect(floor18?.rangePosition.zone).not.toBe('middle')
    expect(floor18?.warnings.map(({ kind }) => kind)).toEqual([
      floor18?.rangePosition.zone === 'slack' ? 'below-range' : 'off-middle',
    ])
  })

  it('warns where a note leaves the range, below and above', () => {
    const { floor16 } = plan({ anchor: { drumId: 'tom12', note: { semitone: 40, cents: 0 } } })
    expect(floor16?.warnings).toContainEqual({ kind: 'below-range' })
    const { tom10 } = plan({ anchor: { drumId: 'tom12', note: { semitone: 58, cents: 0 } } })
    expect(tom10?.warnings).toContainEqual({ kind: 'above-range' })
  })

  it('flags two drums on one note, on both', () => {
    const drums: PlanDrum[] = [...KIT, { id: 'tom12b', role: 'tom', diameterIn: 12, batter }]
    const { tom12, tom12b, tom10 } = plan({ drums })
    expect(tom12?.warnings).toContainEqual({ kind: 'shared-note', withDrumIds: ['tom12b'] })
    expect(tom12b?.warnings).toContainEqual({ kind: 'shared-note', withDrumIds: ['tom12'] })
    expect(tom10?.warnings.map(({ kind }) => kind)).not.toContain('shared-note')
  })

  it('a kit without toms: kick and snare in the middle of their ranges', () => {
    const { kick, snare } = plan({ drums: KIT.slice(0, 2), anchor: undefined })
    expect([kick?.origin, snare?.origin]).toEqual(['middle', 'middle'])
    expect([kick?.rangePosition.zone, snare?.rangePosition.zone]).toEqual(['middle', 'middle'])
    expect(planNotes({ template: template('fourths'), drums: [] })).toEqual([])
  })

  it.each<[string, Partial<NotePlanInput>]>([
    ['anchor', { anchor: { drumId: 'kick', note: D3 } }],
    ['anchor', { anchor: { drumId: 'gone', note: D3 } }],
    ['anchor', { drums: KIT.map((drum) => ({ ...drum, lockedNote: { semitone: 49, cents: 0 } })) }],
    ['drums', { drums: [...KIT, ...KIT] }],
    ['cents', { anchor: { drumId: 'tom12', note: { semitone: 50, cents: Number.NaN } } }],
    ['referenceHz', { referenceHz: 500 }],
  ])('refuses nonsense, naming %s', (field, change) => {
    expect(() => plan(change)).toThrow(expect.objectContaining({ field }))
  })
})
