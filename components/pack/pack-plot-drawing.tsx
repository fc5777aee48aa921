import { SceneDrawing } from '@/components/signature/scene-drawing'
import type { PackPlot } from '@/lib/advance/pack-document'
import { buildScene, channelKey, screenTextSizes } from '@/plots/index'
import type { LengthUnits } from '@/plots/index'

/** How large a metre is when the drawing is as wide as a desk page. */
const pxPerM = 95

/** The plot of a pack on its reader's stage. */
export function PackPlotDrawing({ plot, units }: { plot: PackPlot; units: LengthUnits }) {
  const scene = buildScene({
    document: plot.document,
    kit: new Map(plot.kit.map((piece) => [piece.id, piece])),
    channels: new Map(plot.channels.map(({ pieceId, output, number }) => [channelKey(pieceId, output), number])),
    sizes: screenTextSizes(pxPerM),
    units,
    stage: plot.stage,
  })
  return (
    <>
      <p className="mt-1 text-soft">{plot.stageName}, seen from above, audience at the foot</p>
      <SceneDrawing scene={scene} label={`Plot on ${plot.stageName}`} className="mt-2 max-h-[80vh] w-full bg-sheet" />
    </>
  )
}
