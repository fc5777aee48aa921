import { SceneDrawing } from '@/components/signature/scene-drawing'
import type { PackPlot } from '@/lib/advance/pack-document'
import { buildScene, channelKey, isInset, kitInset, screenTextSizes } from '@/plots/index'
import type { LengthUnits } from '@/plots/index'

/** How large a metre is when the drawing is as wide as a desk page. */
const pxPerM = 95
/** The box of paper that the kit is laid out for; on a page it is then as wide as its place. */
const insetBox = { widthMm: 260, heightMm: 170 }

/** The plot of a pack on its reader's stage. */
export function PackPlotDrawing({ plot, units }: { plot: PackPlot; units: LengthUnits }) {
  const { document, stage } = plot
  const kit = new Map(plot.kit.map((piece) => [piece.id, piece]))
  const channels = new Map(plot.channels.map(({ pieceId, output, number }) => [channelKey(pieceId, output), number]))
  const inset = kitInset({ document, kit, channels, units, box: insetBox })
  const scene = buildScene({
    ...{ document, kit, channels, units, stage },
    sizes: screenTextSizes(pxPerM),
    unlabelled: (piece) => inset !== null && isInset(piece, kit),
  })
  return (
    <>
      <p className="mt-1 text-soft">{plot.stageName}, seen from above, audience at the foot</p>
      <SceneDrawing scene={scene} label={`Plot on ${plot.stageName}`} className="mt-2 max-h-[80vh] w-full bg-sheet" />
      {inset && (
        <SceneDrawing scene={inset.scene} label="The kit, drawn large" className="mt-2 max-h-[70vh] w-full bg-sheet" />
      )}
    </>
  )
}
