import type { PackPlot } from '@/lib/advance/pack-document'
import { PAPER_SCALES, largestScaleThatFits } from '@/plots/geometry/paper'
import type { Scene } from '@/plots/render/build-scene'
import { buildScene, channelKey } from '@/plots/render/build-scene'
import type { KitInset } from '@/plots/render/kit-inset'
import { isInset, kitInset } from '@/plots/render/kit-inset'
import { paperTextSizes } from '@/plots/render/text-size'
import type { LengthUnits } from '@/plots/symbols/length-words'

export interface PlotSheet {
  readonly scene: Scene
  /** Printed at 1:`scale`. */
  readonly scale: number
  /** The kit drawn large, or null when no kit piece is placed or the kit is spread too wide for a page of its own. */
  readonly inset: (KitInset & { readonly orientation: 'portrait' | 'landscape' }) | null
}

/** A stage far larger than a page at the usual scales still has to print: at most this many halvings more. */
const FURTHER_HALVINGS = 4

/**
 * A plot laid out for paper: the stage at the largest of the usual scales at which it fits the box (1:50 and 1:100, or 1:48
 * and 1:96; a still larger stage at half that, and so on), and the kit inset at 1:10 or 1:20. Words of the kit stand in the
 * inset when there is one, and on the stage when there is none.
 */
export function plotSheet(
  plot: PackPlot,
  units: LengthUnits,
  boxes: { stage: Box; inset: Record<'portrait' | 'landscape', Box> },
): PlotSheet {
  const kit = new Map(plot.kit.map((piece) => [piece.id, piece]))
  const channels = new Map(plot.channels.map(({ pieceId, output, number }) => [channelKey(pieceId, output), number]))
  // The page turned whichever way draws the kit larger.
  const inset =
    (['landscape', 'portrait'] as const)
      .flatMap((orientation) => {
        const drawn = kitInset({ document: plot.document, kit, channels, units, box: boxes.inset[orientation] })
        return drawn?.fits ? [{ ...drawn, orientation }] : []
      })
      .sort((a, b) => a.scale - b.scale)[0] ?? null
  const sceneAt = (scale: number) =>
    buildScene({
      ...{ document: plot.document, kit, channels, units, stage: plot.stage },
      sizes: paperTextSizes(scale),
      unlabelled: (piece) => inset !== null && isInset(piece, kit),
    })
  const scales = scalesOf(units)
  for (const scale of scales) {
    const scene = sceneAt(scale)
    const { minXM, maxXM, minYM, maxYM } = scene.bounds
    const area = { widthM: maxXM - minXM, depthM: maxYM - minYM }
    if (largestScaleThatFits(area, boxes.stage, [scale]) !== null) return { scene, scale, inset }
  }
  const smallest = scales[scales.length - 1] ?? 1600
  return { scene: sceneAt(smallest), scale: smallest, inset }
}

type Box = { readonly widthMm: number; readonly heightMm: number }

function scalesOf(units: LengthUnits): number[] {
  const usual = PAPER_SCALES[units]
  const last = usual[usual.length - 1] ?? 100
  return [...usual, ...Array.from({ length: FURTHER_HALVINGS }, (_, index) => last * 2 ** (index + 1))]
}
