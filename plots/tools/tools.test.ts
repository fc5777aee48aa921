import { describe, expect, it } from 'vitest'
import { plotPoint } from '../geometry/point'
import { apply } from '../model/apply'
import { emptyDocument, newPiece, type PlotDocument } from '../model/document'
import { rightHandedKit, rightHandedPlot } from '../render/right-handed-kit'
import { parseLengthM } from '../symbols/parse-length'
import { movePieces } from './move-pieces'
import { nudge } from './nudge'
import { pickPiece } from './pick-piece'
import { pieceByItself, pieceOf, shelfFromKit, shelfOfKinds, type ShelfItem } from './shelf'
import { turnBy, turnTowards } from './turn-pieces'

const none = new Set<string>()
const movesOf = (action: ReturnType<typeof nudge>) =>
  Object.fromEntries((action?.moves ?? []).map((move) => [move.pieceId, [move.xM, move.yM]]))

describe('moving', () => {
  const move = (pieceIds: string[], leadId: string, byXM: number, byYM: number, isSnapping = false) =>
    movePieces({
      document: rightHandedPlot,
      kit: rightHandedKit,
      pieceIds,
      leadId,
      byXM,
      byYM,
      snap: isSnapping ? { reachM: 0.03, gridM: null } : null,
    })

  it('takes the microphone of a drum along, and a microphone alone by itself', () => {
    expect(movesOf(move(['tom'], 'tom', 0.1, 0.2).action)).toEqual({ tom: [0.24, 3.35], 'mic-tom': [0.4, 3.18] })
    expect(movesOf(move(['mic-tom'], 'mic-tom', 0.1, 0).action)).toEqual({ 'mic-tom': [0.4, 2.98] })
  })

  it('leaves locked pieces where they are', () => {
    const locked = apply(rightHandedPlot, { type: 'edit', pieceId: 'tom', changes: { locked: true } })
    expect(
      movePieces({
        document: locked,
        kit: rightHandedKit,
        pieceIds: ['throne'],
        leadId: 'throne',
        byXM: 1,
        byYM: 0,
        snap: null,
      }).action?.moves,
    ).toHaveLength(1)
    expect(nudge(locked, ['tom'], { key: 'ArrowUp', shiftKey: false, altKey: false })).toMatchObject({
      moves: [{ pieceId: 'mic-tom' }],
    })
  })

  it('snaps a kick to the centre line and shows the guide', () => {
    const { action, guides } = move(['kick'], 'kick', 0.06, 0, true)
    expect(movesOf(action)['kick']?.[0]).toBe(0)
    expect(guides).toContainEqual({ kind: 'upright', xM: 0, why: 'centre line' })
  })

  it('brings two drums to touch', () => {
    // Tom 12 and Tom 14 stand at (0.14, 3.15) and (-0.25, 3.17): radii 0.1524 and 0.1778 m.
    const { action } = move(['tom'], 'tom', -0.05, 0.01, true)
    const [x = NaN, y = NaN] = movesOf(action)['tom'] ?? []
    expect(Math.hypot(x + 0.25, y - 3.17)).toBeCloseTo(0.1524 + 0.1778, 4)
  })

  it('goes 5 cm by an arrow, 50 with Shift, 1 with Alt, as seen on the sheet', () => {
    const by = (key: string, shiftKey = false, altKey = false) =>
      movesOf(nudge(rightHandedPlot, ['throne'], { key, shiftKey, altKey }))['throne']
    expect(by('ArrowRight')).toEqual([0.05, 4.05])
    expect(by('ArrowUp', true)).toEqual([0, 4.55])
    expect(by('ArrowDown', false, true)).toEqual([0, 4.04])
    expect(nudge(rightHandedPlot, ['throne'], { key: 'a', shiftKey: false, altKey: false })).toBeNull()
  })
})

describe('turning', () => {
  it('adds degrees clockwise and stays within a turn', () => {
    expect(turnBy(rightHandedPlot, ['kick'], -15)).toEqual({
      type: 'rotate',
      turns: [{ pieceId: 'kick', rotationDeg: 345 }],
    })
    expect(turnBy(rightHandedPlot, ['nobody'], 15)).toBeNull()
  })

  it('faces the pointer in steps of 15°, or freely', () => {
    const wedge = newPiece({ id: 'w', kind: 'wedge' })
    // A pointer due stage right of a piece that rests facing the audience: a quarter turn clockwise.
    expect(turnTowards(wedge, plotPoint(-2, 0.05), false).turns).toEqual([{ pieceId: 'w', rotationDeg: 90 }])
    expect(turnTowards(wedge, plotPoint(-1, -1.7320508), true).turns).toEqual([{ pieceId: 'w', rotationDeg: 30 }])
  })
})

describe('picking', () => {
  const at = (xM: number, yM: number, chosen = none) =>
    pickPiece(rightHandedPlot, rightHandedKit, plotPoint(xM, yM), 0.02, chosen)?.id

  it('takes what is on top', () => {
    expect(at(0.14, 3.15)).toBe('tom')
    expect(at(-0.1, 2.42)).toBe('mic-kick')
    expect(at(5, 5)).toBeUndefined()
  })

  it('takes a riser at its edge, and by its ground once chosen', () => {
    expect(at(-1.2, 3.3)).toBe('riser')
    expect(at(1, 4.3)).toBeUndefined()
    expect(at(1, 4.3, new Set(['riser']))).toBe('riser')
  })
})

describe('the shelf', () => {
  const item = (items: ShelfItem[], name: string) => {
    const found = items.find((one) => one.name === name)
    if (!found) throw new Error(`${name} is not on the shelf`)
    return found
  }

  it('opens with what the kit holds and the plot does not', () => {
    expect(shelfFromKit(rightHandedPlot, rightHandedKit).map((one) => [one.name, one.hint])).toEqual([
      ['Dynamic', '3 left'],
    ])
    const without = apply(rightHandedPlot, { type: 'remove', pieceIds: ['tom'] })
    expect(shelfFromKit(without, rightHandedKit).map((one) => one.name)).toEqual(['Tom 12', 'Dynamic'])
  })

  it('finds other pieces by name, other names or size', () => {
    expect(shelfOfKinds('wed', 'metric').map((one) => one.name)).toEqual(['Wedge'])
    expect(shelfOfKinds('Monitor', 'metric').map((one) => one.name)).toEqual(['Wedge'])
    expect(shelfOfKinds('2.4 ×', 'metric').map((one) => one.name)).toEqual(['Riser'])
    expect(shelfOfKinds('nothing like it', 'metric')).toEqual([])
    // 2.4 m is 94.5 in: 7 ft 10 in to the nearest inch.
    expect(shelfOfKinds('7 ft 10', 'imperial').map((one) => one.name)).toEqual(['Riser'])
  })

  it('places a drum as a reference to the kit and nothing more', () => {
    const piece = pieceOf(
      item(shelfFromKit(emptyDocument, rightHandedKit), 'Tom 12'),
      'new',
      plotPoint(1, 2),
      emptyDocument,
    )
    expect(piece).toEqual(newPiece({ id: 'new', kind: 'drum', kitEntryId: 'k-tom', xM: 1, yM: 2 }))
  })

  it('aims a microphone at the drum it is put down by, and sends it to one that has none', () => {
    const dynamic = item(shelfFromKit(rightHandedPlot, rightHandedKit), 'Dynamic')
    expect(pieceOf(dynamic, 'm', plotPoint(0.3, 3.0), rightHandedPlot).aim).toEqual({ pieceId: 'tom' })
    expect(pieceOf(dynamic, 'm', plotPoint(4, 1), rightHandedPlot).aim).toBeNull()
    const noMic = apply(rightHandedPlot, { type: 'remove', pieceIds: ['mic-floor'] })
    expect(pieceByItself(dynamic, 'm', noMic, rightHandedKit, plotPoint(0, 0)).aim).toEqual({ pieceId: 'floor' })
  })

  it('finds free ground', () => {
    const crowded: PlotDocument = { ...emptyDocument, pieces: { a: newPiece({ id: 'a', kind: 'amp', xM: 0, yM: 2 }) } }
    const amp = item(shelfOfKinds('amp', 'metric'), 'Amp')
    const spot = pieceByItself(amp, 'b', crowded, rightHandedKit, plotPoint(0, 2))
    expect(Math.abs(spot.xM) >= 0.65 || Math.abs(spot.yM - 2) >= 0.35).toBe(true)
  })
})

describe('typed lengths', () => {
  it('read metric and imperial, and refuse the rest', () => {
    // 8 ft = 2.4384 m, 7 ft 10 in = 94 in = 2.3876 m, 22 in = 0.5588 m: exact by the definition of the inch.
    const cases: [string, number][] = [
      ['2.4', 2.4],
      ['2,4 m', 2.4],
      ['-35 cm', -0.35],
      ['−1 m', -1],
      ['8 ft', 2.4384],
      ['7\' 10"', 2.3876],
      ['22 in', 0.5588],
      ['1200mm', 1.2],
    ]
    for (const [text, metres] of cases) expect(parseLengthM(text, 'metric'), text).toBeCloseTo(metres, 10)
    expect(parseLengthM('8', 'imperial')).toBeCloseTo(2.4384, 10)
    for (const text of ['', 'm', 'two', '1..2', '3 cubits', '1 m x'])
      expect(parseLengthM(text, 'metric'), text).toBeNull()
  })
})
