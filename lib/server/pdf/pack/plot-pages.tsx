import { View } from '@react-pdf/renderer'
import { planningCaution } from '@/lib/advance/cautions'
import type { PackDocument, PackPlot } from '@/lib/advance/pack-document'
import { areaWords } from '@/plots/symbols/length-words'
import { contentMm, mm } from '../paper-measure'
import type { PlotSheet } from '../plot-sheet'
import { plotSheet } from '../plot-sheet'
import { SceneSvg } from '../scene-svg'
import { Figures, Heading, Plain } from '../words'
import { KitKey } from './kit-key'
import { PageFrame } from './page-frame'
import { PlotLegend } from './plot-legend'

const sideMm = 52
const gapMm = 4
/** Height kept for the line of words over the inset. */
const insetHeadMm = 9
/** Width of the key beside the inset, which stands there when the drawing leaves the room. */
const keyMm = 72

/** The stage to scale with its legend, and the kit drawn large on a page of its own. */
export function PlotPages({ pack, plot }: { pack: PackDocument; plot: PackPlot }) {
  const room = contentMm(pack.paper, 'landscape')
  const sheet = plotSheet(plot, pack.units, {
    stage: { widthMm: room.widthMm - sideMm - gapMm, heightMm: room.heightMm },
    inset: { landscape: underHead(room), portrait: underHead(contentMm(pack.paper, 'portrait')) },
  })
  return (
    <>
      <PageFrame pack={pack} title="Plot" orientation="landscape">
        <View style={{ flexDirection: 'row', height: mm(room.heightMm) }}>
          <View style={{ width: mm(sideMm), marginRight: mm(gapMm) }}>
            <Heading size={14}>{plot.stageName}</Heading>
            <Plain>{`Stage ${areaWords(plot.stage.widthM, plot.stage.depthM, pack.units)}`}</Plain>
            <Figures bold size={11} style={{ marginTop: mm(2) }}>
              {`1:${sheet.scale}`}
            </Figures>
            <Plain size={8}>Print at 100 %, not fitted to the page. Check with the scale bar.</Plain>
            {sheet.inset && (
              <Plain size={8} style={{ marginTop: mm(1.5) }}>
                {`The kit is drawn large on the next page, 1:${sheet.inset.scale}, with names, notes and channels.`}
              </Plain>
            )}
            {sheet.scene.unplaced.length > 0 && (
              <Plain size={8} style={{ marginTop: mm(1.5) }}>
                {`${sheet.scene.unplaced.length} names found no room at this scale.`}
              </Plain>
            )}
            <PlotLegend units={pack.units} />
            <View style={{ flexGrow: 1 }} />
            <Plain size={7.5} colour="soft">
              {planningCaution}
            </Plain>
          </View>
          <View style={{ flex: 1, alignItems: 'center', justifyContent: 'center' }}>
            <SceneSvg scene={sheet.scene} scale={sheet.scale} />
          </View>
        </View>
      </PageFrame>
      {sheet.inset && (
        <PageFrame pack={pack} title="Kit" orientation={sheet.inset.orientation}>
          <View style={{ height: mm(insetHeadMm), flexDirection: 'row', alignItems: 'baseline' }}>
            <Figures bold size={11}>{`1:${sheet.inset.scale}  `}</Figures>
            <Plain size={8}>
              Seen from above, audience at the foot. Each drum with its own lugs and its note; a kick is its rectangle.
              Figures beside microphones are channels.
            </Plain>
          </View>
          <View
            style={{
              height: mm(underHead(contentMm(pack.paper, sheet.inset.orientation)).heightMm),
              flexDirection: 'row',
            }}
          >
            {leavesRoomForKey(sheet.inset, pack) && (
              <View style={{ width: mm(keyMm), marginRight: mm(gapMm) }}>
                <KitKey pack={pack} plot={plot} />
              </View>
            )}
            <View style={{ flex: 1, alignItems: 'center', justifyContent: 'center' }}>
              <SceneSvg scene={sheet.inset.scene} scale={sheet.inset.scale} />
            </View>
          </View>
        </PageFrame>
      )}
    </>
  )
}

function leavesRoomForKey({ scene, scale, orientation }: NonNullable<PlotSheet['inset']>, pack: PackDocument): boolean {
  const drawnMm = ((scene.bounds.maxXM - scene.bounds.minXM) * 1000) / scale
  return contentMm(pack.paper, orientation).widthMm - drawnMm >= keyMm + gapMm
}

function underHead({ widthMm, heightMm }: { widthMm: number; heightMm: number }) {
  return { widthMm, heightMm: heightMm - insetHeadMm }
}
