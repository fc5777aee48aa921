import { View } from '@react-pdf/renderer'
import type { Bounds } from '@/plots/geometry/bounds'
import { cymbal } from '@/plots/symbols/cymbal'
import { hoop, kick } from '@/plots/symbols/hoop'
import { lengthWords, type LengthUnits } from '@/plots/symbols/length-words'
import { microphone } from '@/plots/symbols/microphone'
import type { Shape } from '@/plots/symbols/shape'
import { riser, wedge } from '@/plots/symbols/stage-pieces'
import { mm } from '../paper-measure'
import { SceneSvg } from '../scene-svg'
import { Plain } from '../words'

interface Entry {
  readonly words: string
  readonly shapes: readonly Shape[]
  /** Half the drawn width and depth, metres; the lugs stand a little out. */
  readonly halfM: readonly [number, number]
  readonly scale: number
}

const entries: readonly Entry[] = [
  { words: 'drum, a tick for each lug', shapes: hoop(0.3, 6), halfM: [0.18, 0.18], scale: 50 },
  { words: 'kick: diameter by depth', shapes: kick(0.5, 0.36, 8), halfM: [0.26, 0.21], scale: 80 },
  { words: 'cymbal', shapes: cymbal(0.45, false), halfM: [0.23, 0.23], scale: 65 },
  { words: 'microphone, its channel beside it', shapes: microphone(0.06, 0.18), halfM: [0.06, 0.1], scale: 30 },
  { words: 'wedge, facing the player', shapes: wedge(0.6, 0.45), halfM: [0.31, 0.24], scale: 95 },
  { words: 'riser', shapes: riser(2.4, 2.4), halfM: [1.22, 1.22], scale: 360 },
]

/** What the signs of the plot mean, drawn by the plot's own symbols (here not to the plot's scale). */
export function PlotLegend({ units }: { units: LengthUnits }) {
  return (
    <View style={{ marginTop: mm(4) }}>
      {entries.map(({ words, shapes, halfM: [x, y], scale }) => {
        const bounds: Bounds = { minXM: -x, maxXM: x, minYM: -y, maxYM: y }
        return (
          <View key={words} style={{ flexDirection: 'row', alignItems: 'center', marginBottom: 3 }}>
            <View style={{ width: mm(11) }}>
              <SceneSvg scene={{ items: shapes.map((shape) => ({ ...shape, pieceId: null })), bounds }} scale={scale} />
            </View>
            <View style={{ flex: 1 }}>
              <Plain size={8}>{words}</Plain>
            </View>
          </View>
        )
      })}
      <Plain size={8}>{`Grid ${lengthWords(1, units)}; chain line: centre line.`}</Plain>
    </View>
  )
}
