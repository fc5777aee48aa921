import { View } from '@react-pdf/renderer'
import type { PackDocument, PackPlot } from '@/lib/advance/pack-document'
import { isInset } from '@/plots/render/kit-inset'
import { ink } from '../ink'
import { mm } from '../paper-measure'
import { Figures, Heading, Plain } from '../words'

/** What the signs of the drawn kit stand for: each drum with its size and note, each channel with its microphone. */
export function KitKey({ pack, plot }: { pack: PackDocument; plot: PackPlot }) {
  const kit = new Map(plot.kit.map((piece) => [piece.id, piece]))
  const drawn = new Set(
    plot.channels.flatMap(({ pieceId, number }) => {
      const piece = plot.document.pieces[pieceId]
      return piece && isInset(piece, kit) ? [number] : []
    }),
  )
  const channels = pack.channels.filter(({ number }) => drawn.has(number))
  return (
    <View>
      <Title>Drums</Title>
      {pack.sheets.map((sheet) => (
        <View key={sheet.entryId} wrap={false} style={row}>
          <View style={{ flex: 1 }}>
            <Plain bold>{sheet.name}</Plain>
            <Plain size={8}>{sheet.sizeWords}</Plain>
          </View>
          <Figures bold>{sheet.note?.name ?? '–'}</Figures>
        </View>
      ))}
      {channels.length > 0 && (
        <View style={{ marginTop: mm(5) }}>
          <Title>Channels</Title>
          {channels.map(({ number, name }) => (
            <View key={number} wrap={false} style={row}>
              <Figures bold style={{ width: mm(8) }}>
                {String(number)}
              </Figures>
              <Plain>{name}</Plain>
            </View>
          ))}
        </View>
      )}
    </View>
  )
}

const row = { flexDirection: 'row', paddingVertical: 2, borderBottom: `0.4pt solid ${ink.line}` } as const

function Title({ children }: { children: string }) {
  return (
    <View style={{ borderBottom: `0.75pt solid ${ink.ink}`, paddingBottom: 1 }}>
      <Heading size={11}>{children}</Heading>
    </View>
  )
}
