import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { boundsOverlap } from '../geometry/bounds'
import { footprintBounds, footprintContains } from '../geometry/footprint'
import { plotPoint } from '../geometry/point'
import { toScreen } from '../geometry/view'
import { apply } from '../model/apply'
import { emptyDocument, newPiece, type PlotDocument } from '../model/document'
import { pieceFootprint } from '../symbols/piece-footprint'
import type { TextShape } from '../symbols/shape'
import { buildScene, type Scene, type SceneItem } from './build-scene'
import { kitInset } from './kit-inset'
import { placeLabels } from './place-labels'
import { rightHandedChannels, rightHandedKit, rightHandedPlot } from './right-handed-kit'
import { sceneSvg } from './scene-svg'
import { paperTextSizes, screenTextSizes } from './text-size'

const sceneOf = (document: PlotDocument, pxPerM = 300, units: 'metric' | 'imperial' = 'metric'): Scene =>
  buildScene({
    document,
    kit: rightHandedKit,
    channels: rightHandedChannels,
    sizes: screenTextSizes(pxPerM),
    units,
    stage: document.stage,
  })
const scene = sceneOf(rightHandedPlot)
const of = (pieceId: string, from: Scene = scene): SceneItem[] => from.items.filter((item) => item.pieceId === pieceId)
const parts = (pieceId: string, part: string, from: Scene = scene) =>
  of(pieceId, from).filter((item) => item.part === part)
const words = (from: Scene) =>
  from.items.filter((item): item is TextShape & { pieceId: string | null } => item.shape === 'text')
const boxOf = (pieceId: string) => {
  const piece = rightHandedPlot.pieces[pieceId]
  if (!piece) throw new Error(`no piece ${pieceId}`)
  return footprintBounds(pieceFootprint(rightHandedPlot, piece, rightHandedKit))
}

describe('a right-hander’s kit on the sheet', () => {
  const view = { pxPerM: 100, originXPx: 0, originYPx: 0 }
  const at = (pieceId: string) => {
    const piece = rightHandedPlot.pieces[pieceId]
    if (!piece) throw new Error(`no piece ${pieceId}`)
    return toScreen(view, plotPoint(piece.xM, piece.yM))
  }

  it('has its hats on the right of the sheet and its floor tom on the left', () => {
    expect(at('hats').xPx).toBeGreaterThan(at('snare').xPx)
    expect(at('floor').xPx).toBeLessThan(at('snare').xPx)
  })

  it('has its throne at the top, its toms below the snare and its kick lowest of the drums', () => {
    const drums = ['snare', 'tom', 'low', 'floor']
    for (const drum of drums) {
      expect(at('throne').yPx).toBeLessThan(at(drum).yPx)
      expect(boxOf('kick').minYM).toBeLessThan(boxOf(drum).minYM)
      expect(at('kick').yPx).toBeGreaterThan(at(drum).yPx)
    }
    expect(at('tom').yPx).toBeGreaterThan(at('snare').yPx)
    expect(at('low').yPx).toBeGreaterThan(at('snare').yPx)
  })

  it('says audience at the foot, upstage at the top, stage left at the right', () => {
    const word = (text: string) => words(scene).find((item) => item.text === text)?.at ?? plotPoint(NaN, NaN)
    expect(word('audience').yM).toBeLessThan(0)
    expect(word('upstage').yM).toBeGreaterThan(rightHandedPlot.stage.depthM)
    expect(word('stage left').xM).toBeGreaterThan(rightHandedPlot.stage.widthM / 2)
    expect(word('stage right').xM).toBeLessThan(-rightHandedPlot.stage.widthM / 2)
  })
})

describe('the hoop drawing', () => {
  it('has the drum’s own diameter and one tick per lug, standing outside the shell', () => {
    for (const [pieceId, inches, lugs] of [
      ['snare', 14, 10],
      ['tom', 12, 6],
      ['low', 14, 8],
      ['floor', 16, 8],
    ] as const) {
      const shell = parts(pieceId, 'shell')[0]
      if (shell?.shape !== 'circle') throw new Error('a drum is a circle')
      // 1 in = 0.0254 m exactly.
      expect(shell.radiusM * 2).toBeCloseTo(inches * 0.0254, 12)
      expect(parts(pieceId, 'hoop')).toHaveLength(1)
      const ticks = parts(pieceId, 'lug')
      expect(ticks).toHaveLength(lugs)
      for (const tick of ticks) {
        if (tick.shape !== 'line') throw new Error('a lug is a line')
        expect(Math.hypot(tick.from.xM - shell.centre.xM, tick.from.yM - shell.centre.yM)).toBeCloseTo(
          shell.radiusM,
          12,
        )
        expect(Math.hypot(tick.to.xM - shell.centre.xM, tick.to.yM - shell.centre.yM)).toBeGreaterThan(shell.radiusM)
      }
    }
  })

  it('draws a kick as a rectangle, diameter by depth, with the claws of both heads that show from above', () => {
    const shell = parts('kick', 'shell')[0]
    if (shell?.shape !== 'polygon') throw new Error('a kick is a rectangle')
    const xs = shell.points.map((point) => point.xM)
    const ys = shell.points.map((point) => point.yM)
    expect(Math.max(...xs) - Math.min(...xs)).toBeCloseTo(22 * 0.0254, 12)
    expect(Math.max(...ys) - Math.min(...ys)).toBeCloseTo(16 * 0.0254, 12)
    // Eight lugs a head: four of each head stand on the upper half.
    expect(parts('kick', 'claw')).toHaveLength(8)
  })

  it('turns with the kick', () => {
    const turned = sceneOf(apply(rightHandedPlot, { type: 'rotate', turns: [{ pieceId: 'kick', rotationDeg: 90 }] }))
    const shell = parts('kick', 'shell', turned)[0]
    if (shell?.shape !== 'polygon') throw new Error('a kick is a rectangle')
    const xs = shell.points.map((point) => point.xM)
    expect(Math.max(...xs) - Math.min(...xs)).toBeCloseTo(16 * 0.0254, 12)
  })

  it('carries the drum’s name and note inside itself', () => {
    const floor = rightHandedPlot.pieces['floor']
    if (!floor) throw new Error('no floor tom')
    const footprint = pieceFootprint(rightHandedPlot, floor, rightHandedKit)
    const inside = words(scene).filter((word) => word.pieceId === 'floor')
    expect(inside.map((word) => word.text)).toEqual(['Floor 16', 'E2'])
    for (const word of inside) expect(footprintContains(footprint, word.at)).toBe(true)
  })
})

describe('microphones', () => {
  it('point at the drum they aim at, wherever it is moved', () => {
    const tipTowards = (document: PlotDocument) => {
      const wedge = parts('mic-kick', 'microphone', sceneOf(document))[0]
      if (wedge?.shape !== 'polygon') throw new Error('a microphone is a wedge')
      const [a, b, c, d] = wedge.points
      if (!a || !b || !c || !d) throw new Error('four corners')
      const tip = plotPoint((a.xM + b.xM) / 2, (a.yM + b.yM) / 2)
      const tail = plotPoint((c.xM + d.xM) / 2, (c.yM + d.yM) / 2)
      return { x: tip.xM - tail.xM, y: tip.yM - tail.yM }
    }
    expect(tipTowards(rightHandedPlot).y).toBeGreaterThan(0)
    const away = apply(rightHandedPlot, { type: 'move', moves: [{ pieceId: 'kick', xM: -0.1, yM: 0.5 }] })
    expect(tipTowards(away).y).toBeLessThan(0)
    const gone = apply(rightHandedPlot, { type: 'remove', pieceIds: ['kick'] })
    // Its own rotation is 0: facing the audience.
    expect(tipTowards(gone).y).toBeLessThan(0)
  })

  it('carry their channel number, and none when no channel takes them', () => {
    expect(
      words(scene)
        .filter((word) => word.pieceId === 'mic-tom')
        .map((word) => word.text),
    ).toEqual(['3'])
    const bare = buildScene({
      document: rightHandedPlot,
      kit: rightHandedKit,
      channels: new Map(),
      sizes: screenTextSizes(300),
      units: 'metric',
      stage: null,
    })
    expect(words(bare).filter((word) => word.pieceId === 'mic-tom')).toEqual([])
  })
})

describe('words on the drawing', () => {
  /** The box a line of words is sure to cover: 0.5 em a letter, from 0.7 em above the baseline to 0.1 below. */
  const cover = (word: TextShape) => {
    const half = ([...word.text].length * word.sizeM * 0.5) / 2
    return {
      minXM: word.at.xM - half,
      maxXM: word.at.xM + half,
      minYM: word.at.yM - word.sizeM * 0.1,
      maxYM: word.at.yM + word.sizeM * 0.7,
    }
  }

  it('never lie over each other, at any zoom', () => {
    for (const pxPerM of [30, 60, 100, 150, 300, 600]) {
      const drawn = words(sceneOf(rightHandedPlot, pxPerM)).filter((word) => word.part === 'label')
      expect(drawn.length).toBeGreaterThan(5)
      for (const [index, a] of drawn.entries())
        for (const b of drawn.slice(index + 1))
          expect(boundsOverlap(cover(a), cover(b)), `“${a.text}” over “${b.text}” at ${pxPerM} px/m`).toBe(false)
    }
  })

  it('never lie over each other however the pieces stand', () => {
    const place = fc.record({
      xM: fc.double({ min: -2, max: 2, noNaN: true }),
      yM: fc.double({ min: 0, max: 4, noNaN: true }),
    })
    const sizes = screenTextSizes(120)
    fc.assert(
      fc.property(fc.array(place, { minLength: 2, maxLength: 12 }), (places) => {
        const { texts } = placeLabels(
          places.map((at, index) => ({
            pieceId: `p${index}`,
            lines: [{ text: `Piece ${index}`, role: 'name', ink: 'ink' }],
            footprint: { shape: 'circle', centre: plotPoint(at.xM, at.yM), radiusM: 0.2 },
            prefer: 'inside',
            priority: 0,
          })),
          [],
          sizes,
        )
        for (const [index, a] of texts.entries())
          for (const b of texts.slice(index + 1)) expect(boundsOverlap(cover(a), cover(b))).toBe(false)
      }),
    )
  })

  it('name every drum and cymbal when zoomed to the kit', () => {
    const shown = words(scene).map((word) => word.text)
    for (const entry of rightHandedKit.values())
      if (entry.kind === 'drum' || entry.kind === 'cymbal') expect(shown).toContain(entry.name)
    expect(scene.unplaced).toEqual([])
  })

  it('give a riser’s size in the reader’s units', () => {
    const riser = (from: Scene) => words(from).find((word) => word.pieceId === 'riser')?.text
    expect(riser(scene)).toBe('riser 2.4 × 2.4 m, 0.4 m high')
    const eightFeet = apply(rightHandedPlot, {
      type: 'edit',
      pieceId: 'riser',
      changes: { widthM: 2.4384, depthM: 2.4384, heightM: 0.3048 },
    })
    expect(riser(sceneOf(eightFeet, 300, 'imperial'))).toBe('riser 8 × 8 ft, 1 ft high')
  })
})

describe('what the drawing does not know', () => {
  it('draws an unknown kind as a labelled box of its own size', () => {
    const document: PlotDocument = {
      ...emptyDocument,
      pieces: { h: newPiece({ id: 'h', kind: 'hologram', widthM: 1.5, depthM: 1, yM: 2 }) },
    }
    const drawn = of('h', sceneOf(document))
    const box = drawn.find((item) => item.part === 'unknown')
    if (box?.shape !== 'polygon') throw new Error('an unknown piece is a box')
    expect(Math.max(...box.points.map((point) => point.xM))).toBeCloseTo(0.75, 12)
    expect(drawn.some((item) => item.shape === 'text' && item.text === 'hologram')).toBe(true)
  })

  it('draws a piece whose kit entry is gone as a ghost that says so', () => {
    const kit = new Map([...rightHandedKit].filter(([id]) => id !== 'k-tom'))
    const ghostly = buildScene({
      document: rightHandedPlot,
      kit,
      channels: rightHandedChannels,
      sizes: screenTextSizes(800),
      units: 'metric',
      stage: null,
    })
    expect(parts('tom', 'ghost', ghostly)).toHaveLength(1)
    expect(
      words(ghostly)
        .filter((word) => word.pieceId === 'tom')
        .map((word) => word.text),
    ).toContain('gone from the kit')
  })
})

describe('on paper', () => {
  it('insets the kit at 1:10 where it fits and 1:20 where it does not', () => {
    const input = {
      document: rightHandedPlot,
      kit: rightHandedKit,
      channels: rightHandedChannels,
      units: 'metric',
    } as const
    const large = kitInset({ ...input, box: { widthMm: 270, heightMm: 240 } })
    expect(large).toMatchObject({ scale: 10, fits: true })
    const small = kitInset({ ...input, box: { widthMm: 130, heightMm: 120 } })
    expect(small).toMatchObject({ scale: 20, fits: true })
    expect(kitInset({ ...input, box: { widthMm: 20, heightMm: 20 } })).toMatchObject({ scale: 20, fits: false })
    expect(kitInset({ ...input, document: emptyDocument, box: { widthMm: 130, heightMm: 120 } })).toBeNull()
    const texts = words(large?.scene ?? scene).map((word) => word.text)
    for (const text of ['Kick 22', 'A1', 'Snare 14', 'G♯3', 'Tom 12', 'D3', 'Floor 16', 'E2', '1', '5'])
      expect(texts).toContain(text)
    expect(large?.scene.items.filter((item) => item.part === 'lug')).toHaveLength(10 + 6 + 8 + 8)
    expect(large?.scene.items.some((item) => item.part === 'stage edge' || item.part === 'riser')).toBe(false)
  })

  it('text keeps its paper size at every scale', () => {
    // 2.9 mm on paper at 1:50 is 0.145 m on the stage, at 1:100 twice that.
    expect(paperTextSizes(50).name).toBeCloseTo(0.145, 12)
    expect(paperTextSizes(100).name).toBeCloseTo(0.29, 12)
  })

  it('writes an SVG in stage millimetres with upstage at the top, painted by class', () => {
    const svg = sceneSvg(scene)
    expect(svg.startsWith('<svg xmlns="http://www.w3.org/2000/svg" viewBox="')).toBe(true)
    const throne = svg.match(/data-part="seat" data-piece="throne" cx="([-\d.]+)" cy="([-\d.]+)" r="([-\d.]+)"/)
    expect(throne?.slice(1).map(Number)).toEqual([0, -4050, 170])
    expect(svg).toContain('class="stroke-brass fill-none weight-fine" data-part="edge" data-piece="hats"')
    expect(svg.match(/<text /g)?.length).toBe(words(scene).length)
  })

  it('escapes what people type', () => {
    const document: PlotDocument = {
      ...emptyDocument,
      pieces: { t: newPiece({ id: 't', kind: 'text', label: '<b>"M&M"</b>', yM: 2 }) },
    }
    expect(sceneSvg(sceneOf(document))).toContain('&lt;b&gt;&quot;M&amp;M&quot;&lt;/b&gt;')
  })
})
