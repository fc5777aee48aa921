import { describe, expect, it, vi } from 'vitest'
import { createNoteSession } from './note-session'
import type { Shelf } from './note-session'

const choices = { templateId: 'fourths', anchorId: null, apartSemitones: 2, headsToo: true, othersFollow: false }
const at = (semitone: number) => ({ note: { semitone, cents: 0 }, noteLocked: false, headRelationCents: 0 })
const to = (id: string, semitone: number) => (draft: object) => ({ ...draft, [id]: at(semitone) })

function shelf(): Shelf & { kept: Map<string, string> } {
  const kept = new Map<string, string>()
  return {
    kept,
    getItem: (key) => kept.get(key) ?? null,
    setItem: (key, value) => void kept.set(key, value),
    removeItem: (key) => void kept.delete(key),
  }
}
const open = (on: Shelf | null, rigId = 'rig') =>
  createNoteSession({ rigId, shelf: on, choices, now: () => new Date('2031-10-14T12:00:00Z') })

describe('the plan while it is made', () => {
  it('outlives the page on its device, for its own rig, until it is set or dropped', () => {
    const device = shelf()
    const first = open(device)
    first.change('tom to D3', to('tom', 50))
    first.choose({ apartSemitones: 3 })
    const again = open(device)
    expect(again.state()).toMatchObject({
      draft: { tom: at(50) },
      choices: { apartSemitones: 3 },
      keptAt: '2031-10-14T12:00:00.000Z',
    })
    // What the server drew is shown until the device has been read.
    expect(again.fresh().draft).toEqual({})
    expect(open(device, 'another rig').state().draft).toEqual({})
    again.change('back to the notes in the kit', () => ({}))
    expect(open(device).state()).toMatchObject({ draft: {}, keptAt: null })
    first.wasSet({ tom: at(48) })
    expect(device.kept.size).toBe(0)
  })

  it('begins with the kit when the device kept nonsense, nothing, or cannot keep', () => {
    const device = shelf()
    for (const nonsense of ['{"half":', '{"draft":{"tom":{"note":{"semitone":500,"cents":0}}}}', 'null']) {
      device.kept.set('hoopwright notes rig', nonsense)
      expect(open(device).state()).toMatchObject({ draft: {}, choices, keptAt: null })
    }
    const full: Shelf = {
      ...shelf(),
      setItem: () => {
        throw new Error('no room')
      },
    }
    for (const on of [full, null]) {
      const session = open(on)
      session.change('tom to D3', to('tom', 50))
      expect(session.state().draft).toEqual({ tom: at(50) })
    }
  })

  it('makes one step of the whole way that a note is drawn, and none when it is let go', () => {
    const device = shelf()
    const session = open(device)
    const heard = vi.fn()
    const leave = session.subscribe(heard)
    session.slide(to('tom', 49))
    session.slide(to('tom', 51))
    expect(session.state()).toMatchObject({ draft: { tom: at(51) }, inHand: {} })
    // Nothing is kept of a note in the air.
    expect(device.kept.size).toBe(0)
    session.letGo()
    expect(session.state()).toMatchObject({ draft: {}, inHand: null, history: { undo: [] } })
    session.slide(to('tom', 52))
    session.slide(to('tom', 53))
    session.putDown('tom to F3')
    expect(session.state().history.undo).toEqual([{ says: 'tom to F3', before: {}, after: { tom: at(53) } }])
    expect(device.kept.size).toBe(1)
    session.putDown('again')
    expect(session.state().history.undo).toHaveLength(1)
    leave()
    const times = heard.mock.calls.length
    expect(times).toBeGreaterThan(0)
    session.undo()
    expect(heard).toHaveBeenCalledTimes(times)
    expect(session.state().draft).toEqual({})
  })

  it('looks at another plan without taking it; a move on it takes it in the same step', () => {
    const session = open(null)
    session.change('tom to D3', to('tom', 50))
    const tried = { id: '2', name: 'plan 2', draft: { tom: at(45), floor: at(40) } }
    session.look(tried)
    expect(session.state()).toMatchObject({ draft: { tom: at(50) }, trying: tried })
    session.look(null)
    expect(session.state()).toMatchObject({ draft: { tom: at(50) }, trying: null })
    session.look(tried)
    session.change('tom to A♯2', to('tom', 46))
    expect(session.state()).toMatchObject({ draft: { tom: at(46), floor: at(40) }, trying: null })
    session.undo()
    expect(session.state().draft).toEqual({ tom: at(50) })
  })

  it('undoes past a setting, to the notes that the kit had', () => {
    const session = open(null)
    session.change('tom to D3', to('tom', 50))
    session.wasSet({ tom: at(48) })
    expect(session.state().draft).toEqual({})
    session.undo()
    expect(session.state().draft).toEqual({ tom: at(48) })
    session.redo()
    expect(session.state().draft).toEqual({ tom: at(50) })
    session.redo()
    expect(session.state().draft).toEqual({ tom: at(50) })
  })
})
