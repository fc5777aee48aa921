import type { Bounds } from '../geometry/bounds'
import { plotPoint } from '../geometry/point'
import type { StageSize } from '../model/document'
import type { LengthUnits } from '../symbols/length-words'
import type { DrawnShape, LineShape, TextShape } from '../symbols/shape'
import { textWidthM, type TextSizes } from './text-size'

/** Grid step of the drawing, metres. */
export const GRID_M = 1

/** The words round the stage, to be given in the reader's language. */
export interface StageWords {
  readonly upstage: string
  readonly audience: string
  readonly stageLeft: string
  readonly stageRight: string
}

export const stageWords: StageWords = {
  upstage: 'upstage',
  audience: 'audience',
  stageLeft: 'stage left',
  stageRight: 'stage right',
}

export interface StageFrame {
  readonly shapes: readonly DrawnShape[]
  /** Where its words stand, so that labels keep clear. */
  readonly boxes: readonly Bounds[]
  /** Everything it draws. */
  readonly bounds: Bounds
}

/** The stage itself: grid, outline, centre line, the words for its four sides and a scale bar below the edge. */
export function stageFrame(stage: StageSize, sizes: TextSizes, units: LengthUnits, words: StageWords): StageFrame {
  const half = stage.widthM / 2
  const em = sizes.small
  const overM = em * 1.2
  const line = (
    x1: number,
    y1: number,
    x2: number,
    y2: number,
    part: string,
    paint: Partial<LineShape>,
  ): LineShape => ({
    shape: 'line',
    from: plotPoint(x1, y1),
    to: plotPoint(x2, y2),
    part,
    ...paint,
  })
  const grid: LineShape[] = []
  for (let x = GRID_M; x < half; x += GRID_M)
    for (const side of [-x, x]) grid.push(line(side, 0, side, stage.depthM, 'grid', { stroke: 'line', weight: 'hair' }))
  for (let y = GRID_M; y < stage.depthM; y += GRID_M)
    grid.push(line(-half, y, half, y, 'grid', { stroke: 'line', weight: 'hair' }))
  const text = (words: string, x: number, y: number, rotationDeg: number, anchor: TextShape['anchor']): TextShape => ({
    shape: 'text',
    text: words,
    role: 'small',
    ink: 'soft',
    at: plotPoint(x, y),
    sizeM: em,
    anchor,
    rotationDeg,
    part: 'stage words',
  })
  const bar = scaleBar(units)
  const barY = -overM - em * 2.6
  const shapes: DrawnShape[] = [
    ...grid,
    {
      shape: 'polygon',
      points: [plotPoint(-half, 0), plotPoint(half, 0), plotPoint(half, stage.depthM), plotPoint(-half, stage.depthM)],
      part: 'stage edge',
      stroke: 'soft',
      weight: 'fine',
    },
    line(0, -overM, 0, stage.depthM + overM, 'centre line', { stroke: 'soft', weight: 'fine', dash: 'chain' }),
    text(words.upstage, 0, stage.depthM + overM + em * 0.4, 0, 'middle'),
    text(words.audience, 0, -overM - em, 0, 'middle'),
    text(words.stageRight, -half - em * 0.5, stage.depthM / 2, -90, 'middle'),
    text(words.stageLeft, half + em * 0.5, stage.depthM / 2, 90, 'middle'),
    {
      shape: 'polygon',
      points: [
        plotPoint(-half, barY),
        plotPoint(-half + bar.lengthM, barY),
        plotPoint(-half + bar.lengthM, barY + em * 0.28),
        plotPoint(-half, barY + em * 0.28),
      ],
      part: 'scale bar',
      fill: 'ink',
    },
    text(bar.words, -half + bar.lengthM + em * 0.5, barY - em * 0.1, 0, 'start'),
  ]
  const wide = (words: string) => textWidthM(words, 'small', sizes) / 2
  const boxes: Bounds[] = [
    box(-wide(words.upstage), stage.depthM + overM, wide(words.upstage), stage.depthM + overM + em * 1.4),
    box(-wide(words.audience), -overM - em * 1.3, wide(words.audience), -overM),
    box(-half - em * 1.6, stage.depthM / 2 - wide(words.stageRight), -half, stage.depthM / 2 + wide(words.stageRight)),
    box(half, stage.depthM / 2 - wide(words.stageLeft), half + em * 1.6, stage.depthM / 2 + wide(words.stageLeft)),
    box(-half, barY - em * 0.3, -half + bar.lengthM + em * 0.5 + 2 * wide(bar.words), barY + em),
  ]
  const bounds = box(-half - em * 1.8, barY - em * 0.5, half + em * 1.8, stage.depthM + overM + em * 1.8)
  return { shapes, boxes, bounds }
}

function scaleBar(units: LengthUnits): { lengthM: number; words: string } {
  return units === 'metric' ? { lengthM: 1, words: '1 m' } : { lengthM: 4 * 0.3048, words: '4 ft' }
}

function box(minXM: number, minYM: number, maxXM: number, maxYM: number): Bounds {
  return { minXM, minYM, maxXM, maxYM }
}
